import { keepPreviousData, useMutation, useQuery } from '@tanstack/react-query';
import { fitsAnswerSchema, scalingAnswerSchema } from '../../shared/contracts/fits';
import { estimateAnswerSchema, type EstimateRequest } from '../../shared/contracts/samples';
import { api, queryString } from '../api/client';
import { keys } from './keys';
import { staleTimes } from './staleTimes';

/** The choice on the Scaling screen, as its address holds it. */
export interface ScalingQuery {
  version?: string;
  y?: string;
  yStructure?: string;
  x?: string;
  xStructure?: string;
  clades?: readonly string[];
  method?: string;
  level?: number;
  without?: readonly string[];
}

const { published } = staleTimes;

/** Fits of a frozen version (`working`: of the working set, for reviewers and curators). */
export function useScaling(query: ScalingQuery, working = false) {
  return useQuery({
    queryKey: keys.scaling.fit({ ...query, working }),
    queryFn: ({ signal }) => api.get(`/scaling${working ? '/working' : ''}${queryString({ ...query })}`, scalingAnswerSchema, { signal }),
    placeholderData: keepPreviousData,
    staleTime: working ? staleTimes.working : published,
  });
}

export interface PlaceQuestion {
  /** What is placed; it enters no line. */
  species: { slug: string; x: number; y: number };
  /** Species means of its clade's fit. */
  points: readonly { id: string; x: number; y: number }[];
  level: number;
}

/** Place of a species on the least-squares line fitted without it, with the prediction interval of one new species; `data` is null where the others give no line. */
export function usePlaceOnLine(question: PlaceQuestion | null) {
  return useQuery({
    queryKey: keys.scaling.place(question ?? {}),
    queryFn: async ({ signal }) => {
      if (question === null) return null;
      const { species, level } = question;
      const points = question.points.filter(({ id }) => id !== species.slug).map(({ id, x, y }) => ({ id, x, y }));
      if (points.length < 3) return null;
      const { fits } = await api.send('POST', '/fits', { points, method: 'ols', level, predictAt: [species.x] }, fitsAnswerSchema, { signal });
      const prediction = fits[0]?.predictions?.[0];
      if (!prediction || prediction.estimate === null) return null;
      const { estimate, prediction: { lower, upper }, extrapolated } = prediction;
      return { ratio: species.y / estimate, lower: lower === null ? null : lower / estimate, upper: upper === null ? null : upper / estimate, extrapolated: extrapolated ?? false, n: points.length };
    },
    staleTime: staleTimes.frozen,
    enabled: question !== null,
  });
}

/** The sample calculator; nothing is stored. */
export function useEstimate() {
  return useMutation({ mutationFn: (request: EstimateRequest) => api.send('POST', '/samples/estimate', request, estimateAnswerSchema) });
}

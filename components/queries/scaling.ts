import { keepPreviousData, useMutation, useQuery } from '@tanstack/react-query';
import { scalingAnswerSchema } from '../../shared/contracts/fits';
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

/** The sample calculator; nothing is stored. */
export function useEstimate() {
  return useMutation({ mutationFn: (request: EstimateRequest) => api.send('POST', '/samples/estimate', request, estimateAnswerSchema) });
}

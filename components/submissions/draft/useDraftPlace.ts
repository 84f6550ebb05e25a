import { router, useLocalSearchParams } from 'expo-router';
import { reachField } from './reachField';
import { stepFrom, stepOfPath, type Step, type StepKey } from './steps';

export interface DraftPlace {
  step: Step;
  /** Index of the structure and of the sample that are open. */
  structure: number;
  sample: number;
  go: (to: { step?: StepKey; structure?: number; sample?: number }) => void;
  /** Opens the step, structure and sample of a field and puts the cursor in it. */
  reach: (path: string) => void;
}

const indexFrom = (text: string | undefined): number => Math.max(0, (Number.parseInt(text ?? '1', 10) || 1) - 1);

/** Time for the step to be drawn before a field in it is sought. */
const DRAWN_MS = 120;

/** Where in the form one is; the address holds it, so a reload and a link come back to it. */
export function useDraftPlace(kind: 'specimen' | 'literature'): DraftPlace {
  const params = useLocalSearchParams<{ step?: string; structure?: string; sample?: string }>();
  const go: DraftPlace['go'] = ({ step, structure, sample }) =>
    router.setParams({
      ...(step === undefined ? null : { step }),
      ...(structure === undefined ? null : { structure: String(structure + 1), sample: String((sample ?? 0) + 1) }),
      ...(structure === undefined && sample !== undefined ? { sample: String(sample + 1) } : null),
    });
  const reach = (path: string) => {
    const found = /^structures\.(\d+)(?:\.samples\.(\d+))?/.exec(path);
    go({ step: stepOfPath(path), ...(found ? { structure: Number(found[1]), sample: Number(found[2] ?? 0) } : null) });
    setTimeout(() => reachField(path), DRAWN_MS);
  };
  return { step: stepFrom(params.step, kind), structure: indexFrom(params.structure), sample: indexFrom(params.sample), go, reach };
}

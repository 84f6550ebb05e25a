import type { EstimateAnswer, EstimateRequest } from '../../../shared/contracts/samples';
import { estimateSample } from '../../../shared/domain/sampleEstimate';

/**
 * The estimate of one sample in the shape of the public answer; nothing is stored.
 * @param request mass in g, volumes in mL, dilution final ÷ original; validated by its contract
 * @returns cells, neurons, other cells scaled up with technical error and 95 % limits, per-mg values of the tissue
 *   counted, and every check; what the entries do not give is null
 */
export function estimateOne(request: EstimateRequest): EstimateAnswer {
  const estimate = estimateSample(request);
  const { value, lower, upper } = estimate.neuronFraction;
  const { dispersion } = estimate;
  return {
    structureMassG: estimate.structureMassG,
    cells: estimate.cells,
    neurons: estimate.neurons,
    otherCells: estimate.otherCells,
    cellsPerMg: estimate.cellsPerMg,
    neuronsPerMg: estimate.neuronsPerMg,
    neuronFraction: { value, lower, upper },
    aliquotCv: estimate.aliquotCv,
    poissonCv: estimate.poissonCv,
    dispersion: dispersion === null ? null : { statistic: dispersion.statistic, df: dispersion.df, p: dispersion.p },
    standardErrorKind: estimate.standardErrorKind,
    aliquotsForTargetCv: estimate.aliquotsForTargetCv,
    aliquotsStillNeeded: estimate.aliquotsStillNeeded,
    checks: estimate.checks,
  };
}

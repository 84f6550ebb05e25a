import type { CheckResult } from '../../contracts/checks';
import type { SampleEstimate, SampleInput } from '../sampleTypes';
import {
  checkAliquotCv, checkDispersionTooSmall, checkExcessCv, checkFewAliquots, checkNucleiPerSquare, checkVolumeOfOneSquare, checkWholeNuclei,
} from './aliquotChecks';
import { checkFewNeunNuclei, checkNeunFieldsDisagree, checkNeunNearEnds, checkNeunPossible } from './neunChecks';
import { applicable, outcome } from './outcome';
import { checkScaleUp } from './scaleUpChecks';

/** A mass or volume is above zero; null where the field is empty or the number is possible. */
function checkAboveZero(value: number | null | undefined, code: string, path: string, what: string): CheckResult | null {
  if (value === null || value === undefined || value > 0) return null;
  return outcome('blocks', code, path, `${what} must be above zero.`, value, '> 0');
}

/**
 * Every check that one sample's own numbers allow.
 *
 * `estimate` is what was computed from `input`; `structure` is its key, or null where unknown (the
 * general range of the NeuN-positive fraction then holds); `side` is the declared side; `prefix` is
 * the path before the sample's fields, with its dot. The impossible comes first.
 */
export function checkSample(
  input: SampleInput,
  estimate: Omit<SampleEstimate, 'checks'>,
  options: { structure: string | null; side: string | null; prefix: string },
): CheckResult[] {
  const { prefix, structure } = options;
  const impossible = [
    ...applicable([
      checkAboveZero(input.tissueMassG, 'mass-not-positive', `${prefix}tissueMassG`, 'The mass of the tissue'),
      checkAboveZero(input.suspensionVolumeMl, 'volume-not-positive', `${prefix}suspensionVolumeMl`, 'The volume of the suspension'),
      (input.dilution ?? 1) >= 1
        ? null
        : outcome('blocks', 'dilution-below-one', `${prefix}dilution`, 'The dilution is the final over the original volume, a number of 1 or more.', input.dilution ?? null, '≥ 1'),
      ...input.aliquots.map((aliquot, i) => checkAboveZero(aliquot.volumeMl, 'volume-not-positive', `${prefix}aliquots.${i}.volumeMl`, 'The counted volume')),
    ]),
    ...checkWholeNuclei(input, prefix),
    ...(input.neun ? checkNeunPossible(input.neun, `${prefix}neun`) : []),
  ];
  const scaleUp = checkScaleUp(input.scaleUp ?? null, options.side, `${prefix}scaleUp`);
  // Doubt about numbers that cannot be says nothing.
  if (impossible.length > 0) return [...impossible, ...scaleUp];
  return [
    ...scaleUp,
    ...applicable([
      checkAliquotCv(estimate, prefix),
      checkFewAliquots(estimate, prefix),
      checkExcessCv(estimate, prefix),
      checkDispersionTooSmall(input, estimate, prefix),
      checkNucleiPerSquare(input, prefix),
      checkVolumeOfOneSquare(input, prefix),
      ...(input.neun
        ? [
            checkFewNeunNuclei(input.neun, `${prefix}neun`),
            checkNeunFieldsDisagree(input.neun, `${prefix}neun`),
            checkNeunNearEnds(input.neun, structure, `${prefix}neun`),
          ]
        : []),
    ]),
  ];
}

import { requirePositive } from './points';

/** A stated law brain = coefficient · body^exponent, masses in grams, with where it comes from. */
export interface BrainMassLaw {
  name: string;
  /** Grams of brain at 1 g of body. */
  coefficient: number;
  exponent: number;
  source: string;
}

/** Jerison's law for mammals: brain = 0.12·body^(2/3), both in grams. */
export const JERISON_1973: BrainMassLaw = {
  name: 'Jerison 1973',
  coefficient: 0.12,
  exponent: 2 / 3,
  source: 'Jerison HJ 1973, Evolution of the Brain and Intelligence, Academic Press',
};

export interface EncephalisationQuotient {
  quotient: number;
  /** Brain mass that the law gives at this body mass. */
  expectedBrainMassG: number;
  law: BrainMassLaw;
  /** The law in words, to be printed beside the number. */
  lawText: string;
}

/**
 * Encephalisation quotient: brain mass divided by what a stated law gives at this body mass.
 *
 * @param brainMassG brain mass in grams, above 0
 * @param bodyMassG body mass in grams, above 0
 * @param law Jerison's unless another, fitted or published, is given (in grams)
 * @throws RangeError when a mass or the law's coefficient is not finite and above 0
 * @source Jerison 1973
 */
export function encephalisationQuotient(
  brainMassG: number, bodyMassG: number, law: BrainMassLaw = JERISON_1973,
): EncephalisationQuotient {
  requirePositive(brainMassG, 'brain mass');
  requirePositive(bodyMassG, 'body mass');
  requirePositive(law.coefficient, 'coefficient of the law');
  if (!Number.isFinite(law.exponent)) throw new RangeError(`exponent of the law must be finite, found ${law.exponent}`);
  const expectedBrainMassG = law.coefficient * bodyMassG ** law.exponent;
  const exponentText = law.exponent === 2 / 3 ? '2/3' : String(Number(law.exponent.toPrecision(4)));
  return {
    quotient: brainMassG / expectedBrainMassG,
    expectedBrainMassG,
    law,
    lawText: `${law.name}: brain = ${Number(law.coefficient.toPrecision(4))} · body^(${exponentText}), in grams`,
  };
}

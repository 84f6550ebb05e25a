/**
 * Limits of the checks. They are common practice in counting laboratories; no publication fixes
 * them. Change one here and every form, review and test follows.
 */
export const limits = {
  aliquotCv: 0.15,
  excessCv: 0.1,
  excessCvDispersionP: 0.05,
  dispersionTooSmallP: 0.99,
  nucleiPerSquareLeast: 10,
  nucleiPerSquareMost: 200,
  aliquotsLeast: 4,
  neunNucleiLeast: 500,
  neunFieldsP: 0.05,
  /** Range of the NeuN-positive fraction; a structure's own range stands before the general one. */
  neunFraction: {
    general: { least: 0.02, most: 0.98 },
    cerebral_cortex: { least: 0.02, most: 0.8 },
    cerebellum: { least: 0.4, most: 0.98 },
    rest_of_brain: { least: 0.01, most: 0.7 },
    olfactory_bulb: { least: 0.05, most: 0.9 },
  } as Readonly<Record<string, { least: number; most: number }>>,
  partsOfWholeLeast: 0.92,
  partsOfWholeMost: 1.03,
  secondSpecimen: 1.7,
  secondSpecimenLoose: 2,
  /** Structures whose second specimen may differ more: small, or defined by complement. */
  looseStructures: ['olfactory_bulb', 'rest_of_brain'] as readonly string[],
  /** A ratio this near to two reads as one side against both. */
  doubleLeast: 1.8,
  doubleMost: 2.2,
  /** Cells against neurons plus other cells as printed: rounding of a table stays below this. */
  cellsSum: 0.03,
} as const;

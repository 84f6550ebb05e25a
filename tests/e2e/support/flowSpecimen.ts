/** The invented animal of the flow: what its contributor types, and what must follow from it. */
export const specimen = {
  species: 'Fabulapithecus nocturnus',
  slug: 'fabulapithecus-nocturnus',
  code: 'QL-2701',
  bodyMassG: '310',
  cortex: {
    structure: 'cerebral_cortex',
    words: 'cerebral cortex',
    side: 'right',
    tissueMassG: '2.08',
    suspensionMl: '20',
    dilution: '12',
    /** Four that count and a fifth that a bubble spoilt, each over four large squares. */
    nuclei: ['301', '289', '312', '295', '151'],
    spoilt: 5,
    neun: [['86', '160'], ['80', '158'], ['84', '155'], ['78', '152']],
  },
  cerebellum: {
    structure: 'cerebellum',
    words: 'cerebellum',
    side: 'both',
    tissueMassG: '0.75',
    suspensionMl: '20',
    dilution: '29',
    /** Three at first; the reviewer asks for the fourth. */
    nuclei: ['298', '307', '291'],
    fourth: '304',
    neun: [['131', '155'], ['126', '150'], ['129', '152'], ['127', '151']],
  },
} as const;

/** Four large squares of 0.1 µL each, in mL. */
const loadMl = 4e-4;

interface Counted {
  nuclei: readonly string[];
  suspensionMl: string;
  dilution: string;
  neun: readonly (readonly [string, string])[];
}

/** By hand: cells = V·D·Σc/Σv, neurons = p·cells, both × `scale`. */
export function estimate({ nuclei, suspensionMl, dilution, neun }: Counted, scale: number): { cells: number; neurons: number } {
  const counted = nuclei.reduce((sum, text) => sum + Number(text), 0);
  const cells = (Number(suspensionMl) * Number(dilution) * counted * scale) / (loadMl * nuclei.length);
  const positive = neun.reduce((sum, [text]) => sum + Number(text), 0);
  const scored = neun.reduce((sum, [, text]) => sum + Number(text), 0);
  return { cells, neurons: (cells * positive) / scored };
}

/** "(3.59 ± 0.10) × 10⁸" → 3.59e8. Throws where it is not of this form. */
export function printedCount(text: string): number {
  const found = /([\d.]+)(?: ± [\d.]+\)?)? × 10([⁰¹²³⁴⁵⁶⁷⁸⁹]+)/.exec(text);
  if (!found) throw new Error(`No count is printed in "${text}".`);
  const power = [...(found[2] ?? '')].map((digit) => '⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(digit)).join('');
  return Number(found[1]) * 10 ** Number(power);
}

/** A picture of one grey pixel, as a microscope would not make it. */
export const smallPng = Buffer.from('iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAAAAAA6fptVAAAACklEQVR4nGNoAAAAggCBd81ytgAAAABJRU5ErkJggg==', 'base64');

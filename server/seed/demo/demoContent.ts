import { specimenContentSchema, type SpecimenContent } from '../../../shared/contracts/content';
import { speciesSlug } from '../../../shared/domain/identifiers';
import type { DemoEntry } from './demonstration';

const parts = (text: string) => text.split(' ').filter((part) => part !== '');

/** The content of a submission as its contributor would have entered it. */
export function demoContent(entry: DemoEntry): SpecimenContent {
  const isDraft = entry.outcome === 'draft';
  return specimenContentSchema.parse({
    kind: 'specimen',
    specimen: {
      nameAsEntered: entry.taxon,
      taxon: speciesSlug(entry.taxon) ?? '',
      code: entry.code,
      origin: entry.origin,
      sex: entry.sex,
      ageClass: entry.ageClass,
      bodyMass: { text: entry.bodyMassG, unit: 'g' },
      bodyMassKind: entry.bodyMassG === '' ? null : 'measured',
      diedOn: entry.diedOn,
      fixedOn: entry.fixedOn,
    },
    massState: isDraft ? null : 'fixed',
    fixation: isDraft ? null : 'perfused',
    structures: entry.structures.map(({ id, structure, mass, samples }) => ({
      id,
      structure,
      mass: { text: mass, unit: 'g' },
      delineation: samples.length > 0 ? ['gross-landmarks'] : [],
      samples: samples.map((sample) => ({
        id: sample.id,
        label: sample.side === 'both' ? 'both sides' : `${sample.side} side`,
        side: sample.side,
        tissueMass: { text: sample.tissueMass, unit: 'g' },
        suspensionVolume: { text: sample.volumeMl, unit: 'mL' },
        dilution: sample.dilution,
        scaleUp: sample.doubled ? { kind: 'other-side', factor: '2', factorSe: '' } : { kind: 'none', factor: '1', factorSe: '' },
        aliquots: parts(sample.counts).map((nuclei) => ({ nuclei, squares: String(sample.squares) })),
        neun: parts(sample.neun).map((field) => {
          const [positive = '', total = ''] = field.split('/');
          return { positive, total };
        }),
        countedOn: entry.countedOn,
        antibodyRrid: 'RRID:AB_2298772',
      })),
    })),
    provenance: { approvalKind: isDraft ? null : 'exempt', approvalText: isDraft ? '' : 'Invented for the demonstration: no animal was used.', licenceAccepted: !isDraft },
    explanations: entry.words,
    note: entry.note,
  });
}

/** The raw counts of an entry as a table, the evidence that a reviewer opens. */
export function demoEvidence(entry: DemoEntry): string {
  const rows = entry.structures.flatMap(({ structure, samples }) =>
    samples.flatMap((sample) => parts(sample.counts).map((nuclei, index) => `${structure},${sample.side},${index + 1},${nuclei},${sample.squares}`)),
  );
  return `${['structure,side,aliquot,nuclei,squares', ...rows].join('\n')}\n`;
}

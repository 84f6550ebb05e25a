import { literatureContentSchema, specimenContentSchema, type LiteratureContent, type SampleEntry, type SpecimenContent } from '../../shared/contracts/content';

/** Contents that pass every check as they stand, for tests that change one thing. */

export function soundSample(changes: Partial<SampleEntry> = {}): SampleEntry {
  const sample = {
    id: 'sample-1',
    label: 'whole cortex',
    side: 'both',
    tissueMass: { text: '0.80', unit: 'g' },
    suspensionVolume: { text: '12', unit: 'mL' },
    chamber: { key: 'improved-neubauer', squareVolume: { text: '', unit: 'µL' } },
    aliquots: [412, 388, 401, 427].map((nuclei) => ({ nuclei: String(nuclei), squares: '4' })),
    neun: [{ positive: '130', total: '260' }, { positive: '128', total: '262' }],
    countedOn: '2026-03-02',
    observer: 'A. Observer',
  };
  return specimenContentSchema.parse({ kind: 'specimen', specimen: {}, provenance: {}, structures: [{ id: 's', samples: [{ ...sample, ...changes }] }] }).structures[0]!.samples[0]!;
}

export function soundSpecimen(code: string, change: (content: SpecimenContent) => void = () => undefined): SpecimenContent {
  const content = specimenContentSchema.parse({
    kind: 'specimen',
    specimen: {
      nameAsEntered: 'Rattus norvegicus',
      taxon: 'rattus-norvegicus',
      code,
      origin: 'captive',
      sex: 'female',
      ageClass: 'adult',
      bodyMass: { text: '300', unit: 'g' },
      bodyMassKind: 'measured',
      diedOn: '2026-02-01',
      fixedOn: '2026-02-01',
    },
    massState: 'fixed',
    fixation: 'perfused',
    structures: [{ id: 'cortex', structure: 'cerebral_cortex', delineation: ['gross-landmarks'], samples: [soundSample()] }],
    provenance: { approvalKind: 'number', approvalText: 'AB-12', licenceAccepted: true },
  });
  change(content);
  return content;
}

export function soundLiterature(doi: string, change: (content: LiteratureContent) => void = () => undefined): LiteratureContent {
  const number = (text: string, unit: string) => ({ text, unit, centre: 'arithmetic', spreadText: '', spreadKind: 'none', n: '4' });
  const content = literatureContentSchema.parse({
    kind: 'literature',
    source: { doi, citation: 'A. Author 2019 A Journal 1:1-2', year: '2019' },
    values: [
      { id: 'rat-cortex', nameAsEntered: 'Rattus norvegicus', taxon: 'rattus-norvegicus', structure: 'cerebral_cortex', structureMass: number('0.77', 'g'), neurons: number('31020000', 'count'), otherCells: number('46620000', 'count'), place: 'Table 1' },
      { id: 'mouse-cortex', nameAsEntered: 'Mus musculus', taxon: 'mus-musculus', structure: 'cerebral_cortex', structureMass: number('0.17', 'g'), neurons: number('13700000', 'count'), otherCells: number('12000000', 'count'), place: 'Table 1' },
    ],
    provenance: { licenceAccepted: true, approvalKind: 'see-source', citation: 'as above', published: true },
  });
  change(content);
  return content;
}

export const wholeChecklist = { rawCounts: true, derivedValues: true, checks: true, evidence: true, provenance: true };

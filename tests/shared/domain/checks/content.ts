import { literatureContentSchema, specimenContentSchema, type LiteratureContent, type SpecimenContent } from '../../../../shared/contracts/content';
import type { CheckResult } from '../../../../shared/contracts/checks';

type Sample = SpecimenContent['structures'][number]['samples'][number];

const mass = (text: string) => ({ text, unit: 'g' });

/** A specimen that nothing is to be said against: four structures of one brain, one sample each. */
export function plainSpecimen(): SpecimenContent {
  const sample = (id: string, tissueMass: string, positive: string) => ({
    id, side: 'both', tissueMass: mass(tissueMass), suspensionVolume: { text: '10', unit: 'mL' },
    aliquots: ['412', '438', '395', '421'].map((nuclei) => ({ nuclei, squares: '4' })),
    neun: [{ positive, total: '600' }], countedOn: '2026-03-04', antibodyRrid: 'RRID:AB_2298772',
  });
  const structure = (key: string, tissueMass: string, positive: string) => ({ id: key, structure: key, samples: [sample(`${key}-1`, tissueMass, positive)] });
  return specimenContentSchema.parse({
    kind: 'specimen',
    specimen: {
      nameAsEntered: 'Aus bus', taxon: 'aus-bus', code: 'AB-01', origin: 'wild', sex: 'female', ageClass: 'adult',
      bodyMass: mass('300'), bodyMassKind: 'measured', diedOn: '2026-03-01', fixedOn: '2026-03-02',
    },
    massState: 'fixed', fixation: 'perfused',
    structures: [
      structure('cerebral_cortex', '0.8', '240'), structure('cerebellum', '0.3', '500'), structure('rest_of_brain', '0.7', '180'), structure('olfactory_bulb', '0.1', '300'),
      { id: 'whole', structure: 'whole_brain', mass: mass('1.92') },
    ],
    provenance: { approvalKind: 'number', approvalText: 'A-12', licenceAccepted: true },
  });
}

/** The plain specimen with one change; `structure` and `sample` are the first ones. */
export function changed(change: (content: SpecimenContent, sample: Sample) => void): SpecimenContent {
  const content = plainSpecimen();
  const sample = content.structures[0]?.samples[0];
  if (sample === undefined) throw new Error('The plain specimen has a sample.');
  change(content, sample);
  return content;
}

/** Values of a source that nothing is to be said against. */
export function plainLiterature(change: (content: LiteratureContent) => void = () => undefined): LiteratureContent {
  const content = literatureContentSchema.parse({
    kind: 'literature',
    source: { doi: '10.1073/pnas.0604911103', year: '2006' },
    values: [
      {
        id: 'v1', nameAsEntered: 'Aus bus', taxon: 'aus-bus', structure: 'cerebral_cortex',
        structureMass: { text: '0.769', unit: 'g', spreadText: '0.113', spreadKind: 'SD', n: '4' },
        cells: { text: '76705000', unit: 'count' }, neurons: { text: '31017192', unit: 'count' }, otherCells: { text: '45687808', unit: 'count' },
      },
    ],
    provenance: { licenceAccepted: true },
  });
  change(content);
  return content;
}

/** Results of one check, as level and path. */
export function found(checks: readonly CheckResult[], code: string): string[] {
  return checks.filter((check) => check.code === code).map((check) => `${check.level} ${check.path}`);
}

/** Results of one check that do not pass. */
export function spoken(checks: readonly CheckResult[], code: string): string[] {
  return found(checks, code).filter((result) => !result.startsWith('passes'));
}

import { literatureValueSchema, sampleEntrySchema, structureEntrySchema, type LiteratureValueEntry, type SampleEntry, type StructureEntry } from '../../../shared/contracts/content';

/** An id that stays with an entry over revisions, so that comments can point at it. */
function newId(): string {
  const random = Array.from({ length: 3 }, () => Math.random().toString(36).slice(2, 6)).join('');
  return `e${Date.now().toString(36)}${random}`;
}

/** A structure without samples: weighed, until one is added. */
export const newStructure = (): StructureEntry => structureEntrySchema.parse({ id: newId() });

const usualAliquots = 4;
const usualSquares = '4';

export const newAliquot = (squares: string = usualSquares): SampleEntry['aliquots'][number] => ({ nuclei: '', squares, excluded: null, note: '' });

/** A sample as most are counted: four aliquots of four large squares, one NeuN field. */
export const newSample = (): SampleEntry =>
  sampleEntrySchema.parse({ id: newId(), aliquots: Array.from({ length: usualAliquots }, () => newAliquot()), neun: [{}] });

/** A row of a source; it begins with the species and kinds of the row before it. */
export function newLiteratureValue(before: LiteratureValueEntry | undefined): LiteratureValueEntry {
  const { nameAsEntered = '', qualifier = 'none', taxon = '', origin = null, massState = null, method = null, bodyMass } = before ?? {};
  return literatureValueSchema.parse({ id: newId(), nameAsEntered, qualifier, taxon, origin, massState, method, ...(bodyMass ? { bodyMass } : null) });
}

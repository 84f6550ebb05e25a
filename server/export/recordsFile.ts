import type { RecordRow, SetAsideScope } from '../../shared/contracts/records';
import type { Column } from './csv';
import { versionCell, type VersionFacts } from './versionFacts';

const axisText = ({ variable, structure }: Exclude<SetAsideScope, 'all'>['a']): string => (structure === null ? variable : `${variable} of ${structure}`);

/** A scope in words: "all fits", or the pair of variables. */
export const scopeText = (scope: SetAsideScope): string => (scope === 'all' ? 'all fits' : `${axisText(scope.a)} with ${axisText(scope.b)}`);

const listText = (parts: readonly string[]): string => parts.join('; ');
const contributorText = ({ name, orcid }: RecordRow['contributors'][number]): string => (orcid === null ? name : `${name} (${orcid})`);

type RecordColumn = Column<RecordRow>;
const text = (name: string, description: string, value: RecordColumn['value']): RecordColumn => ({ name, type: 'string', description, value });
const mass = (name: string, description: string, value: RecordColumn['value']): RecordColumn => ({ name, type: 'number', unit: 'g', description, value });
const count = (name: string, description: string, value: RecordColumn['value']): RecordColumn => ({ name, type: 'number', unit: 'count', description, value });
const flag = (name: string, description: string, value: RecordColumn['value']): RecordColumn => ({ name, type: 'boolean', description, value });

const what: RecordColumn[] = [
  text('record', 'Number of the record, never reused', (row) => row.number),
  { name: 'revision', type: 'integer', description: 'Revision of the record', value: (row) => row.revision },
  text('kind', 'specimen: an animal counted for the register; literature: a value of a publication', (row) => row.kind),
  text('species', 'Species in current use', (row) => row.species),
  text('taxon', 'Address of the species in the register', (row) => row.taxonSlug),
  text('name_as_entered', 'Name that the source or the contributor gave', (row) => row.nameAsEntered),
  text('qualifier', 'Qualifier of the name', (row) => row.qualifier),
  flag('named', 'False for a species without a full name; at genus level (Genus sp.) it enters fits with a mark, else none', (row) => row.named),
  text('lineage', 'Path of clades from the root to the parent of the species', (row) => row.lineage.join(' > ')),
  text('origin', 'wild, captive, domestic, strain or unknown', (row) => row.origin),
  flag('demonstration', 'True for an invented record of the demonstration', (row) => row.demonstration),
  text('structure', 'Key of the structure', (row) => row.structure),
  { name: 'definition_version', type: 'integer', description: 'Version of the definition of the structure', value: (row) => row.definitionVersion },
  text('composition', 'What the structure includes and excludes', (row) => row.composition),
  text('delineation', 'Criteria by which the structure was bounded', (row) => listText(row.delineation)),
  text('specimen', 'Code of the animal in its laboratory', (row) => row.specimen),
  text('pooled_with', 'Further animals pooled in its samples', (row) => listText(row.pooledWith)),
  text('sex', 'Sex of the animal', (row) => row.sex),
  text('age_class', 'Age class of the animal', (row) => row.ageClass),
];
const source: RecordColumn[] = [
  text('source', 'Key of the source, see sources.csv', (row) => row.sourceKey),
  text('source_place', 'Table, figure or page in the source', (row) => row.sourcePlace),
  text('shares_animals_with', 'Sources that hold some of the same animals, and how far', (row) => listText(row.sharesAnimalsWith.map(({ source: other, overlap }) => `${other} (${overlap})`))),
  text('lab', 'Laboratory that contributed the record', (row) => row.lab),
  text('contributors', 'People who contributed the record', (row) => listText(row.contributors.map(contributorText))),
];
const values: RecordColumn[] = [
  { name: 'n', type: 'integer', description: 'Number of animals; empty where the source does not say', value: (row) => row.n },
  text('centre', 'Kind of mean', (row) => row.centre),
  text('spread_kind', 'What the error columns hold', (row) => row.spreadKind),
  mass('body_mass_g', 'Body mass', (row) => row.bodyMassG),
  mass('body_mass_error_g', 'Spread or error of the body mass', (row) => row.bodyMassError),
  text('body_mass_kind', 'measured, estimated, literature or unknown', (row) => row.bodyMassKind),
  mass('structure_mass_g', 'Mass of the structure', (row) => row.structureMassG),
  mass('structure_mass_error_g', 'Spread or error of the mass of the structure', (row) => row.structureMassError),
  count('cells', 'Cells of the whole structure', (row) => row.cells),
  count('cells_error', 'Spread or error of the cells', (row) => row.cellsError),
  count('neurons', 'Neurons of the whole structure', (row) => row.neurons),
  count('neurons_error', 'Spread or error of the neurons', (row) => row.neuronsError),
  count('other_cells', 'Other cells of the whole structure', (row) => row.otherCells),
  count('other_cells_error', 'Spread or error of the other cells', (row) => row.otherCellsError),
  { name: 'cells_per_mg', type: 'number', unit: '1/mg', description: 'Cells per mg of the tissue counted, never scaled', value: (row) => row.cellsPerMg },
  { name: 'neurons_per_mg', type: 'number', unit: '1/mg', description: 'Neurons per mg of the tissue counted, never scaled', value: (row) => row.neuronsPerMg },
  { name: 'other_to_neuron_ratio', type: 'number', unit: '1', description: 'Other cells per neuron', value: (row) => row.otherToNeuronRatio },
  text('mass_state', 'fresh, fixed, cryoprotected or unknown', (row) => row.massState),
  text('fixation', 'perfused, immersed, none or unknown', (row) => row.fixation),
  text('method', 'Method of counting', (row) => row.method),
  text('scaled_up', 'Portions that were doubled or otherwise scaled up', (row) => row.scaledUp),
  text('printed_differently', 'What the source prints where it differs from what is used, and why', (row) => row.printedDifferently),
  text('note', 'Note', (row) => row.note),
  text('approval', 'Approval, permit or exemption', (row) => row.approval),
];
const standing: RecordColumn[] = [
  text('set_aside', 'Fits that leave the record out, and why', (row) => listText(row.setAside.map(({ scope, reason }) => `${scopeText(scope)}: ${reason}`))),
  flag('open_recheck', 'True where a re-check was open when the version was frozen', (row) => row.openRecheck),
  text('approved_at', 'Time of approval, UTC', (row) => row.approvedAt),
  text('approved_by', 'Who approved the revision', (row) => row.approvedBy),
];

/** Columns of records.csv: one row a record, in order of record number. */
export function recordColumns(version: Pick<VersionFacts, 'label' | 'demonstration'>): RecordColumn[] {
  return [text('version', 'Version of the dataset', () => versionCell(version)), ...what, ...source, ...values, ...standing];
}

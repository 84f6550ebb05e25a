/**
 * The structures of the register's first day. Matches to UBERON are from memory and say so; a structure has one
 * only where it is beyond doubt. What a structure includes and excludes is part of its definition version: values
 * of two definitions are never pooled.
 */
export interface SeedStructure {
  key: string;
  name: string;
  parent: string | null;
  animalClass: 'Mammalia' | 'Aves' | null;
  midline?: boolean;
  byComplement?: boolean;
  includes?: string[];
  excludes?: string[];
  note?: string;
  uberon?: { id: string; match: 'exact' | 'close' | 'broad' };
}

const papers = 'As the isotropic-fractionation papers of the first content define it.';

export const structureList: readonly SeedStructure[] = [
  { key: 'whole_brain', name: 'Whole brain', parent: null, animalClass: null, includes: ['olfactory bulb'], excludes: ['spinal cord'], uberon: { id: 'UBERON:0000955', match: 'exact' } },
  { key: 'whole_brain_without_olfactory_bulb', name: 'Whole brain without olfactory bulb', parent: 'whole_brain', animalClass: null, excludes: ['olfactory bulb', 'spinal cord'], note: 'Never pooled with the whole brain.', uberon: { id: 'UBERON:0000955', match: 'broad' } },
  { key: 'brain_not_specified', name: 'Brain, extent not specified', parent: null, animalClass: null, note: 'For sources that do not say what the mass of the brain includes. Never pooled with the other definitions of a brain.', uberon: { id: 'UBERON:0000955', match: 'close' } },
  { key: 'cerebral_cortex', name: 'Cerebral cortex', parent: 'whole_brain', animalClass: 'Mammalia', includes: ['hippocampus', 'underlying white matter'], excludes: ['olfactory bulb', 'basal ganglia'], note: `${papers} Cerebral cortex includes hippocampus and underlying white matter.`, uberon: { id: 'UBERON:0000956', match: 'close' } },
  { key: 'hippocampus', name: 'Hippocampus', parent: 'cerebral_cortex', animalClass: 'Mammalia', uberon: { id: 'UBERON:0002421', match: 'close' } },
  { key: 'cortical_grey_matter', name: 'Cortical grey matter', parent: 'cerebral_cortex', animalClass: 'Mammalia', excludes: ['underlying white matter'] },
  { key: 'cortical_white_matter', name: 'Underlying white matter', parent: 'cerebral_cortex', animalClass: 'Mammalia', excludes: ['cortical grey matter'] },
  { key: 'prefrontal_cortex', name: 'Prefrontal cortex', parent: 'cerebral_cortex', animalClass: 'Mammalia', note: 'Say the delineation criterion.', uberon: { id: 'UBERON:0000451', match: 'close' } },
  { key: 'primary_motor_cortex', name: 'Primary motor cortex', parent: 'cerebral_cortex', animalClass: 'Mammalia', note: 'Say the delineation criterion.', uberon: { id: 'UBERON:0001384', match: 'close' } },
  { key: 'primary_somatosensory_cortex', name: 'Primary somatosensory cortex', parent: 'cerebral_cortex', animalClass: 'Mammalia', note: 'Say the delineation criterion.' },
  { key: 'primary_visual_cortex', name: 'Primary visual cortex', parent: 'cerebral_cortex', animalClass: 'Mammalia', note: 'Say the delineation criterion.', uberon: { id: 'UBERON:0002436', match: 'close' } },
  { key: 'primary_auditory_cortex', name: 'Primary auditory cortex', parent: 'cerebral_cortex', animalClass: 'Mammalia', note: 'Say the delineation criterion.' },
  { key: 'entorhinal_cortex', name: 'Entorhinal cortex', parent: 'cerebral_cortex', animalClass: 'Mammalia', note: 'Say the delineation criterion.', uberon: { id: 'UBERON:0002728', match: 'close' } },
  { key: 'piriform_cortex', name: 'Piriform cortex', parent: 'cerebral_cortex', animalClass: 'Mammalia', note: 'Say the delineation criterion.' },
  { key: 'cerebellum', name: 'Cerebellum', parent: 'whole_brain', animalClass: null, includes: ['cerebellar white matter', 'deep cerebellar nuclei'], uberon: { id: 'UBERON:0002037', match: 'exact' } },
  { key: 'cerebellar_hemisphere', name: 'Cerebellar hemisphere', parent: 'cerebellum', animalClass: 'Mammalia', uberon: { id: 'UBERON:0002245', match: 'exact' } },
  { key: 'cerebellar_vermis', name: 'Cerebellar vermis', parent: 'cerebellum', animalClass: 'Mammalia', midline: true, uberon: { id: 'UBERON:0004720', match: 'exact' } },
  { key: 'rest_of_brain', name: 'Rest of brain', parent: 'whole_brain', animalClass: 'Mammalia', byComplement: true, includes: ['basal ganglia', 'diencephalon', 'brainstem'], excludes: ['cerebral cortex', 'cerebellum', 'olfactory bulb'], note: `${papers} Defined by complement: what is left of the whole brain.` },
  { key: 'basal_ganglia', name: 'Basal ganglia', parent: 'rest_of_brain', animalClass: 'Mammalia', uberon: { id: 'UBERON:0010011', match: 'close' } },
  { key: 'diencephalon', name: 'Diencephalon', parent: 'rest_of_brain', animalClass: 'Mammalia', uberon: { id: 'UBERON:0001894', match: 'exact' } },
  { key: 'thalamus', name: 'Thalamus', parent: 'diencephalon', animalClass: 'Mammalia', note: 'Whether epithalamus and subthalamus are included is said in the delineation.', uberon: { id: 'UBERON:0001897', match: 'close' } },
  { key: 'hypothalamus', name: 'Hypothalamus', parent: 'diencephalon', animalClass: 'Mammalia', uberon: { id: 'UBERON:0001898', match: 'exact' } },
  { key: 'brainstem', name: 'Brainstem', parent: 'rest_of_brain', animalClass: 'Mammalia', includes: ['midbrain', 'pons', 'medulla oblongata'], uberon: { id: 'UBERON:0002298', match: 'close' } },
  { key: 'midbrain', name: 'Midbrain', parent: 'brainstem', animalClass: 'Mammalia', uberon: { id: 'UBERON:0001891', match: 'exact' } },
  { key: 'pons', name: 'Pons', parent: 'brainstem', animalClass: 'Mammalia', uberon: { id: 'UBERON:0000988', match: 'exact' } },
  { key: 'medulla_oblongata', name: 'Medulla oblongata', parent: 'brainstem', animalClass: 'Mammalia', uberon: { id: 'UBERON:0001896', match: 'exact' } },
  { key: 'olfactory_bulb', name: 'Olfactory bulb', parent: 'whole_brain', animalClass: null, uberon: { id: 'UBERON:0002264', match: 'exact' } },
  { key: 'avian_telencephalon', name: 'Telencephalon of birds', parent: 'whole_brain', animalClass: 'Aves', excludes: ['olfactory bulb'], note: 'Birds have no cerebral cortex; the pallium is a part of this.', uberon: { id: 'UBERON:0001893', match: 'close' } },
  { key: 'pallium', name: 'Pallium', parent: 'avian_telencephalon', animalClass: 'Aves', uberon: { id: 'UBERON:0000203', match: 'exact' } },
  { key: 'subpallium', name: 'Subpallium', parent: 'avian_telencephalon', animalClass: 'Aves' },
  { key: 'optic_tectum', name: 'Optic tectum', parent: 'whole_brain', animalClass: 'Aves' },
  { key: 'avian_diencephalon', name: 'Diencephalon of birds', parent: 'whole_brain', animalClass: 'Aves', uberon: { id: 'UBERON:0001894', match: 'close' } },
  { key: 'avian_brainstem', name: 'Brainstem of birds', parent: 'whole_brain', animalClass: 'Aves', excludes: ['optic tectum'], uberon: { id: 'UBERON:0002298', match: 'close' } },
];

export const criterionList = [
  { key: 'cytoarchitecture', name: 'Cytoarchitecture', note: 'Borders drawn from the arrangement of cells in stained sections.' },
  { key: 'topographic-map', name: 'Topographic map', note: 'Borders drawn where a map of the receptor surface or the body ends or reverses.' },
  { key: 'anatomical-connectivity', name: 'Anatomical connectivity', note: 'Borders drawn from traced or imaged connections.' },
  { key: 'cellular-response-properties', name: 'Cellular response properties', note: 'Borders drawn from the responses of recorded cells.' },
  { key: 'regional-response', name: 'Regional response', note: 'Borders drawn from the response of a region, such as imaging.' },
  { key: 'gross-landmarks', name: 'Gross landmarks', note: 'Borders drawn along sulci, tracts or other marks seen with the naked eye.' },
] as const;

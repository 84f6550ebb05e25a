import type { SpeciesPage } from '../../shared/contracts/register';
import type { SharePart } from '../marks/shareRibbons';

/** The parts whose masses and neurons make up a brain; the bulb stands apart from the rest in the published tables. */
const parts = ['cerebral_cortex', 'cerebellum', 'rest_of_brain', 'olfactory_bulb'] as const;

/** Shares of the measured parts in their common mass and neurons; empty where fewer than three have both. */
export function sharesOf(page: Pick<SpeciesPage, 'structures'>): SharePart[] {
  const measured = parts.flatMap((key) => {
    const structure = page.structures.find((candidate) => candidate.key === key);
    const massG = structure?.mean.structureMassG ?? null;
    const neurons = structure?.mean.neurons ?? null;
    return structure && massG !== null && neurons !== null ? [{ key, label: structure.name.toLowerCase(), massG, neurons }] : [];
  });
  if (measured.length < 3) return [];
  const massG = measured.reduce((sum, part) => sum + part.massG, 0);
  const neurons = measured.reduce((sum, part) => sum + part.neurons, 0);
  return measured.map((part) => ({ key: part.key, label: part.label, massShare: part.massG / massG, neuronShare: part.neurons / neurons }));
}

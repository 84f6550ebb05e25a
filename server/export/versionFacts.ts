/** What every file of a version says of it. Nothing here depends on where or when the file is written. */
export interface VersionFacts {
  label: string;
  title: string;
  demonstration: boolean;
  /** When the rows were taken: ISO time in UTC. */
  frozenAt: string;
  licence: string;
  note: string;
  doi: string | null;
  contributors: readonly { name: string; orcid: string | null; records: number }[];
}

export const datasetName = 'Allokarya: brain-tissue masses and cell counts';
export const demonstrationSentence = 'This version holds demonstration records: invented people, invented counts. It is not for science.';

export function versionTitle(label: string, demonstration: boolean): string {
  return `${datasetName}, version ${label}${demonstration ? ' (holds demonstration records)' : ''}`;
}

/** The version as the cells of a table name it, so that a file that has left its folder still says what it is. */
export const versionCell = ({ label, demonstration }: Pick<VersionFacts, 'label' | 'demonstration'>): string => (demonstration ? `${label} (holds demonstration records)` : label);

export const dayOf = (time: string): string => time.slice(0, 10);

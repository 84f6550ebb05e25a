import type { VersionRow } from '../../../db/queries/versions';
import type { VersionFacts } from '../../export/versionFacts';
import type { VersionSummary } from './summary';

/** What files and citations say of a version, from its row, the people behind it and the time its rows were taken. */
export function versionFacts(version: Pick<VersionRow, 'number' | 'title' | 'demonstration' | 'licence' | 'note' | 'doi'>, contributors: VersionSummary['contributors'], takenAt: Date): VersionFacts {
  const { number, title, demonstration, licence, note, doi } = version;
  return { label: String(number), title, demonstration, frozenAt: takenAt.toISOString(), licence, note, doi, contributors };
}

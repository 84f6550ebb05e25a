import { createHash } from 'node:crypto';
import { ensureSource, findSourceIds, putSourceOverlap } from '../../../db/queries/records';
import type { SubmissionRow } from '../../../db/queries/submissions';
import type { Transaction } from '../../../db/client';
import type { SubmissionContent } from '../../../shared/contracts/content';
import type { RecordRow } from '../../../shared/contracts/records';
import { parseDoi } from '../../../shared/domain/identifiers';

const normalised = (citation: string): string => citation.normalize('NFC').toLowerCase().replace(/\s+/g, ' ').trim();

/** Key of a publication: its DOI, else a digest of its citation without regard to capitals and blanks. */
export function publicationKey(doi: string, citation: string): string {
  const parsed = parseDoi(doi);
  if (parsed !== null) return `doi:${parsed}`;
  return `citation:${createHash('sha256').update(normalised(citation)).digest('hex').slice(0, 24)}`;
}

const yearIn = (text: string): number | null => {
  const found = /\b(1[6-9]\d{2}|20\d{2})\b/.exec(text);
  return found === null ? null : Number(found[1]);
};

/** The publication a content states, or null where its values are the laboratory's own and unpublished. */
function publicationOf(content: SubmissionContent): { doi: string; citation: string; year: number | null } | null {
  if (content.kind === 'literature') {
    const { doi, citation, year } = content.source;
    return { doi, citation, year: yearIn(year) ?? yearIn(citation) };
  }
  const { published, doi, citation } = content.provenance;
  return published && (doi.trim() !== '' || citation.trim() !== '') ? { doi, citation, year: yearIn(citation) } : null;
}

const resolvedKey = (text: string): string => {
  const doi = parseDoi(text);
  return doi !== null ? `doi:${doi}` : text.trim();
};

/** What a content says of sources that hold some of the same animals, by their keys. */
export function sharedAnimalsOf(content: SubmissionContent): RecordRow['sharesAnimalsWith'] {
  const stated = content.kind === 'literature' ? [...content.source.sharesAnimalsWith, ...content.provenance.sharesAnimalsWith] : content.provenance.sharesAnimalsWith;
  return stated.flatMap(({ source, overlap }) => (source.trim() === '' ? [] : [{ source: resolvedKey(source), overlap }]));
}

/**
 * Finds or writes the source of a content: a publication by DOI or citation, or one laboratory's own specimens, and
 * notes the sources that share animals with it. A source named that the register does not hold stays in the row only.
 */
export async function ensureSourceOf(tx: Transaction, content: SubmissionContent, submission: SubmissionRow, demonstration: boolean) {
  const publication = publicationOf(content);
  const source =
    publication === null
      ? await ensureSource(tx, { key: `lab:${submission.labId}`, kind: 'lab', citation: `${submission.labName ?? 'A laboratory'}, unpublished specimens`, labId: submission.labId, demonstration })
      : await ensureSource(tx, {
          key: publicationKey(publication.doi, publication.citation),
          kind: 'publication',
          citation: publication.citation.trim() === '' ? `doi:${parseDoi(publication.doi) ?? publication.doi.trim()}` : publication.citation.trim(),
          doi: parseDoi(publication.doi),
          year: publication.year,
          demonstration,
        });
  const shared = sharedAnimalsOf(content);
  const ids = await findSourceIds(tx, shared.map((one) => one.source));
  for (const { source: key, overlap } of shared) {
    const otherId = ids.get(key);
    if (otherId !== undefined && otherId !== source.id) await putSourceOverlap(tx, source.id, otherId, overlap);
  }
  return source;
}

import { z } from 'zod';
import { findTaxaInPlace, type TaxonInPlace } from '../../../db/queries/recordVocabulary';
import { findOpenRechecks } from '../../../db/queries/records';
import { findPersonRefs, findQueuePage, findRevisions, findSubmissionPage, findSubmissions, type RevisionRow } from '../../../db/queries/submissions';
import type { Queryable } from '../../../db/client';
import type { PersonRef } from '../../../shared/contracts/common';
import type { SubmissionItem } from '../../../shared/contracts/submissions';
import type { RevisionStatus } from '../../../shared/contracts/vocabulary';
import { today, type Actor, type Context } from '../../context';
import { decodeCursor, encodeCursor } from '../../paging';
import { cladeOf, headingOf, structureKeysOf, taxonSlugsOf } from './contentFacts';

/** What an item is made of, apart from its revisions. */
export interface ItemSubject {
  id: string;
  kind: SubmissionItem['kind'];
  labName: string | null;
  createdBy: string;
  demonstration: boolean;
}

const unknownPerson = (id: string): PersonRef => ({ id, name: 'Unknown', lab: null });

/** A line of a list, from one revision of a submission and those before it. Pure. */
export function itemOf(
  subject: ItemSubject,
  revisions: readonly RevisionRow[],
  shown: RevisionRow,
  known: { taxa: ReadonlyMap<string, TaxonInPlace>; people: ReadonlyMap<string, PersonRef>; openRecheck: string | null },
): SubmissionItem {
  const before = revisions.findLast((revision) => revision.revision < shown.revision);
  const firstTaxon = known.taxa.get(taxonSlugsOf(shown.content)[0] ?? '') ?? null;
  // A source of many species has no clade of its own.
  const clade = taxonSlugsOf(shown.content).length === 1 ? cladeOf(firstTaxon) : null;
  const by = shown.submittedBy ?? subject.createdBy;
  return {
    id: subject.id,
    kind: subject.kind,
    ...headingOf(shown.content, known.taxa),
    structures: structureKeysOf(shown.content),
    status: shown.status,
    revision: shown.revision,
    answered: before?.status === 'changes-requested' && shown.submittedAt !== null,
    clade: clade?.slug ?? null,
    cladeName: clade?.name ?? null,
    lab: subject.labName,
    by: known.people.get(by) ?? unknownPerson(by),
    updatedAt: shown.updatedAt.toISOString(),
    submittedAt: shown.submittedAt?.toISOString() ?? null,
    demonstration: subject.demonstration,
    openRecheck: known.openRecheck,
  };
}

const placeSchema = z.object({ at: z.iso.datetime(), id: z.uuid() });
interface Place {
  submissionId: string;
  revisionId: string;
  at: Date;
}

async function itemsOf(db: Queryable, day: string, places: readonly Place[]): Promise<SubmissionItem[]> {
  const ids = places.map((place) => place.submissionId);
  const subjects = new Map((await findSubmissions(db, ids)).map((subject) => [subject.id, subject]));
  const revisions = await findRevisions(db, ids);
  const taxa = await findTaxaInPlace(db, revisions.flatMap((revision) => taxonSlugsOf(revision.content)));
  const people = await findPersonRefs(db, [...subjects.values()].map((subject) => subject.createdBy).concat(revisions.flatMap((revision) => revision.submittedBy ?? [])), day);
  const rechecks = await findOpenRechecks(db, ids);
  return places.flatMap((place) => {
    const subject = subjects.get(place.submissionId);
    const own = revisions.filter((revision) => revision.submissionId === place.submissionId);
    const shown = own.find((revision) => revision.id === place.revisionId);
    if (subject === undefined || shown === undefined) return [];
    const openRecheck = rechecks.find((recheck) => recheck.submissionId === place.submissionId && recheck.status === 'open')?.id ?? null;
    return [itemOf(subject, own, shown, { taxa, people, openRecheck })];
  });
}

interface Page {
  items: SubmissionItem[];
  nextCursor: string | null;
}

async function pageOf(db: Queryable, day: string, places: readonly Place[], limit: number, cursorId: (place: Place) => string): Promise<Page> {
  const shown = places.slice(0, limit);
  const last = shown.at(-1);
  const nextCursor = places.length > limit && last !== undefined ? encodeCursor({ at: last.at.toISOString(), id: cursorId(last) }) : null;
  return { items: await itemsOf(db, day, shown), nextCursor };
}

const cursorOf = (cursor: string | undefined) => (cursor === undefined ? null : decodeCursor(cursor, placeSchema));

/**
 * A person's submissions and their laboratory's, last changed first.
 * @param query `status` of the revision that stands, cursor of the page before, limit
 */
export async function listSubmissions(context: Context, actor: Actor, query: { status?: RevisionStatus | undefined; cursor?: string | undefined; limit: number }): Promise<Page> {
  const places = await findSubmissionPage(context.db, { createdBy: actor.id, labId: actor.labId, status: query.status, after: cursorOf(query.cursor), limit: query.limit + 1 });
  return pageOf(context.db, today(context), places, query.limit, (place) => place.submissionId);
}

/** The submissions that wait for a decision, the longest waiting first, the reviewer's own laboratory's among them. */
export async function listReviewQueue(context: Context, query: { cursor?: string | undefined; limit: number }): Promise<Page> {
  const places = await findQueuePage(context.db, { after: cursorOf(query.cursor), limit: query.limit + 1 });
  return pageOf(context.db, today(context), places, query.limit, (place) => place.revisionId);
}

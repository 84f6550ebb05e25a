import { eq } from 'drizzle-orm';
import { attachments, labMemberships, setAsides, taxa } from '../../db/schema/index';
import { recordNumber } from '../../shared/domain/identifiers';
import { seedDemo } from '../../server/seed/demo/seedDemo';
import { readDemonstration } from '../../server/seed/demo/demonstration';
import { findFirstRecordNumber, findSubmissionByCode, findUserIdByEmail } from '../../db/queries/demo';
import { findRechecks } from '../../db/queries/rechecks';
import { answerRecheck } from '../../server/services/rechecks/answerRecheck';
import { askRecheck } from '../../server/services/rechecks/askRecheck';
import { createClient, signInCookie, type TestClient } from './client';
import { makePerson } from './factories';
import type { TestApp } from './testApp';

export const visitors = ['anonymous', 'member', 'contributor', 'colleague', 'stranger', 'reviewer', 'ownReviewer', 'curator', 'administrator'] as const;
export type Visitor = (typeof visitors)[number];

/** The things the table's addresses name; submissions, evidence, records and re-checks are of the contributor's laboratory. */
export interface Things {
  draft: string;
  submitted: string;
  evidence: string;
  /** Approved and in no version yet. */
  record: string;
  open: string;
  answered: string;
  person: string;
  membership: string;
  taxon: string;
  setAside: string;
}

async function submissionOf(app: TestApp, key: string): Promise<string> {
  const { entries, people } = readDemonstration();
  const entry = entries.find((one) => one.key === key);
  const email = people.find((one) => one.key === entry?.by)?.email ?? '';
  const userId = (await findUserIdByEmail(app.context.db, email)) ?? '';
  const found = await findSubmissionByCode(app.context.db, userId, entry?.code ?? '');
  if (found === null) throw new Error(`The demonstration has no entry "${key}".`);
  return found.id;
}

/** The demonstration, with somebody for every way of standing to the contributor's laboratory. */
export async function makeRoleFixtures(app: TestApp): Promise<{ clients: Record<Visitor, TestClient>; things: Things }> {
  const { db, config } = app.context;
  await seedDemo(app.context);
  const signedIn = async (email: string, password?: string) => createClient(app.url, await signInCookie(app.url, email, password));
  const demo = (name: string) => signedIn(`${name}@demo.example`, config.demoPassword);
  const contributorId = (await findUserIdByEmail(db, 'contributor@demo.example')) ?? '';
  const [membership] = await db.select({ id: labMemberships.id, labId: labMemberships.labId }).from(labMemberships).where(eq(labMemberships.userId, contributorId));
  const labId = membership?.labId ?? '';
  const member = await makePerson(db);
  const clients: Record<Visitor, TestClient> = {
    anonymous: app.anonymous,
    member: await signedIn(member.email),
    contributor: await demo('contributor'),
    colleague: await signedIn((await makePerson(db, { roles: ['contributor'], labId })).email),
    stranger: await demo('bram.oduya'),
    reviewer: await demo('reviewer'),
    ownReviewer: await signedIn((await makePerson(db, { roles: ['reviewer'], labId })).email),
    curator: await demo('curator'),
    administrator: await demo('administrator'),
  };

  const [evidence] = await db.select({ id: attachments.id }).from(attachments).where(eq(attachments.submissionId, await submissionOf(app, 'waiting')));
  const record = recordNumber((await findFirstRecordNumber(db, await submissionOf(app, 'approved'))) ?? 0);
  const [open] = await findRechecks(db, { status: 'open', before: null, limit: 1 });
  const [reviewer, contributor] = [await findUserIdByEmail(db, 'reviewer@demo.example'), contributorId].map((id) => ({ id: id ?? '', name: '', email: '', labId: null }));
  if (reviewer === undefined || contributor === undefined) throw new Error('The demonstration has its people.');
  const asked = await askRecheck(app.context, await app.actor(reviewer), record, { question: 'Is the mass that of the fixed tissue?' });
  await answerRecheck(app.context, await app.actor(contributor), asked.id, { answer: 'confirmed', text: 'Weighed after fixation, as stated.' });
  const [aside] = await db.select({ id: setAsides.id }).from(setAsides);
  const [taxon] = await db.select({ slug: taxa.slug }).from(taxa).where(eq(taxa.status, 'proposed'));
  return {
    clients,
    things: {
      draft: await submissionOf(app, 'draft'),
      submitted: await submissionOf(app, 'waiting'),
      evidence: evidence?.id ?? '',
      record,
      open: open?.id ?? '',
      answered: asked.id,
      person: member.id,
      membership: membership?.id ?? '',
      taxon: taxon?.slug ?? '',
      setAside: aside?.id ?? '',
    },
  };
}

import { hashPassword } from 'better-auth/crypto';
import { countBeside, findFirstRecordNumber, findLabIdByName, findSubmissionByCode, findUserIdByEmail } from '../../../db/queries/demo';
import { insertVerifiedPerson } from '../../../db/queries/firstAccount';
import { insertLab } from '../../../db/queries/labs';
import { findActor, insertMembership, insertRole } from '../../../db/queries/people';
import { findSetting, putSetting } from '../../../db/queries/settings';
import { isSlugTaken } from '../../../db/queries/taxa';
import { recordNumber, speciesSlug } from '../../../shared/domain/identifiers';
import { today, type Actor, type Context } from '../../context';
import { askRecheck } from '../../services/rechecks/askRecheck';
import { addAttachment } from '../../services/submissions/attachments';
import { addComment } from '../../services/submissions/addComment';
import { decideRevision } from '../../services/submissions/decideRevision';
import { createSubmission } from '../../services/submissions/drafts';
import { submitRevision } from '../../services/submissions/submitRevision';
import { proposeTaxon } from '../../services/taxa/taxa';
import { demoContent, demoEvidence } from './demoContent';
import { readDemonstration, type DemoEntry, type Demonstration } from './demonstration';

type Actors = ReadonlyMap<string, Actor>;

const setting = 'demonstration';
const memberSince = '2024-01-01';
const everythingLookedAt = { rawCounts: true, derivedValues: true, checks: true, evidence: true, provenance: true };

async function makeLabs(context: Context, { labs }: Demonstration): Promise<Map<string, string>> {
  const ids = new Map<string, string>();
  for (const { key, name, place } of labs) ids.set(key, (await findLabIdByName(context.db, name)) ?? (await insertLab(context.db, { name, place, demonstration: true })));
  return ids;
}

async function makePeople(context: Context, { people }: Demonstration, labs: ReadonlyMap<string, string>): Promise<Actors> {
  const missing = [];
  for (const person of people) if ((await findUserIdByEmail(context.db, person.email)) === null) missing.push(person);
  const passwordHash = missing.length === 0 ? '' : await hashPassword(context.config.demoPassword);
  for (const { name, email, roles, lab } of missing) {
    await context.db.transaction(async (tx) => {
      const userId = await insertVerifiedPerson(tx, { name, email, passwordHash, demonstration: true });
      for (const role of roles) await insertRole(tx, userId, role, null);
      const labId = lab === null ? undefined : labs.get(lab);
      if (labId !== undefined) await insertMembership(tx, { userId, labId, fromDay: memberSince, grantedBy: null });
    });
  }
  const actors = new Map<string, Actor>();
  for (const { key, email } of people) {
    const userId = await findUserIdByEmail(context.db, email);
    const actor = userId === null ? null : await findActor(context.db, userId, today(context));
    // An account that its register has disabled does nothing more.
    if (actor !== null) actors.set(key, actor);
  }
  return actors;
}

async function makeTaxa(context: Context, { taxa }: Demonstration, actors: Actors): Promise<void> {
  for (const { name, parent, proposed } of taxa) {
    const slug = speciesSlug(name);
    const by = actors.get(proposed ? 'contributor' : 'curator');
    if (by === undefined || slug === null || (await isSlugTaken(context.db, slug))) continue;
    await proposeTaxon(context, by, { name, rank: 'species', parent, authority: 'Invented for the demonstration.', demonstration: true });
  }
}

/** Takes one entry from where it stands to where it is to be, by the acts of its people. */
async function makeEntry(context: Context, entry: DemoEntry, actors: Actors): Promise<void> {
  const [contributor, reviewer, curator] = [actors.get(entry.by), actors.get(entry.reviewer), actors.get('curator')];
  if (contributor === undefined || reviewer === undefined || curator === undefined) return;
  const found = await findSubmissionByCode(context.db, contributor.id, entry.code);
  const id = found?.id ?? (await createSubmission(context, contributor, { kind: 'specimen', content: demoContent(entry), demonstration: true })).id;
  // A later revision is somebody's own work, not the demonstration's.
  if (found !== null && found.revision > 1) return;
  let status = found?.status ?? 'draft';
  const beside = await countBeside(context.db, id);
  if (entry.evidence !== undefined && status === 'draft' && beside.attachments === 0) {
    await addAttachment(context, contributor, id, { name: entry.evidence, bytes: Buffer.from(demoEvidence(entry), 'utf8'), fieldPath: 'structures.0', caption: 'Counts as noted at the microscope' });
  }
  if (entry.outcome === 'draft') return;
  if (status === 'draft') {
    await submitRevision(context, contributor, id);
    status = 'submitted';
  }
  if (entry.outcome === 'submitted') return;
  if (entry.comment !== undefined && beside.comments === 0) await addComment(context, reviewer, id, { revision: 1, ...entry.comment });
  if (status === 'submitted') {
    const decision = entry.outcome === 'changes-requested' ? 'request-changes' : 'approve';
    await decideRevision(context, reviewer, id, { revision: 1, decision, comment: entry.decision, checklist: everythingLookedAt });
  }
  if (entry.outcome !== 'recheck' || beside.rechecks > 0) return;
  const number = await findFirstRecordNumber(context.db, id);
  if (number !== null) await askRecheck(context, curator, recordNumber(number), { question: entry.question, fieldPath: 'structures.0' });
}

/**
 * Fills a demonstration register: two invented laboratories, their people, invented species and submissions in every state,
 * made by the same services as anybody's. It is made once: a run that was interrupted is taken up where it ended, and what
 * people do with it afterwards stays.
 * Does nothing outside demo mode.
 */
export async function seedDemo(context: Context): Promise<void> {
  if (!context.demo || (await findSetting(context.db, setting)) === 'complete') return;
  const demonstration = readDemonstration();
  const actors = await makePeople(context, demonstration, await makeLabs(context, demonstration));
  await makeTaxa(context, demonstration, actors);
  for (const entry of demonstration.entries) await makeEntry(context, entry, actors);
  await putSetting(context.db, setting, 'complete');
}

import { findLoadedSourceKeys, findOrMakeSystemActor, findRecordOf, putCarrier } from '../../db/queries/seed';
import { findCurrentVersionNumber, findPreparingVersion } from '../../db/queries/versions';
import { recordNumber } from '../../shared/domain/identifiers';
import type { Actor, Context } from '../context';
import { runFitRefresh } from '../services/dataset/fitRefresh';
import { loadAsSystem } from '../services/submissions/systemLoad';
import { freezeNow, runFreeze } from '../services/versions/freeze';
import { setAside } from '../services/versions/setAside';
import { publishedSources } from './publishedContent';

/** What the first version leaves out of its fits, as the published fits do. */
const leftOut = {
  taxonSlug: 'heterocephalus-glaber',
  structure: 'cerebral_cortex',
  sourceKey: 'doi:10.1159/000330825',
  reason: 'The published fits of cortical mass on neurons leave the naked mole-rat out; its cerebellum and rest of brain stay in them.',
};
const noteOfFirst = [
  'Frozen from the published tables alone.',
  'One record is set aside: the cortex of Heterocephalus glaber, from the fits of its mass and neurons, because the published fits leave it out.',
  'Kept in: the African elephant, which lies far out in x, the human, and the pig, which is the domestic one.',
].join(' ');

async function systemActor(context: Context): Promise<Actor> {
  const { id, name, email } = await findOrMakeSystemActor(context.db);
  return { id, name, email, emailVerified: false, orcid: null, roles: [], labId: null, labName: null, demonstration: false };
}

async function loadSources(context: Context): Promise<void> {
  const loaded = await findLoadedSourceKeys(context.db);
  for (const { doi, content, carrier, licence } of publishedSources()) {
    // A source is loaded in one transaction: where a record of it stands, all do.
    if (!loaded.has(`doi:${doi}`)) await loadAsSystem(context, content);
    await putCarrier(context.db, doi, carrier, licence);
  }
}

async function setMoleRatAside(context: Context, actor: Actor): Promise<void> {
  const record = await findRecordOf(context.db, leftOut);
  if (record === null) throw new Error('The cortex of the naked mole-rat is not in the register.');
  if (record.everSetAside) return;
  const { structure, reason } = leftOut;
  const scope = { a: { variable: 'structureMassG' as const, structure }, b: { variable: 'neurons' as const, structure } };
  const { runId } = await setAside(context, actor, recordNumber(record.number), { scope, reason });
  await runFitRefresh(context, runId);
}

/**
 * The published tables as literature records with a source per row, one of them set aside, frozen as version 1 by the
 * code that freezes any version. Looks at what is there first: an interrupted run is taken up where it ended, and a
 * register that has a version already only gets the records.
 */
export async function seedPublished(context: Context): Promise<void> {
  const actor = await systemActor(context);
  await loadSources(context);
  await setMoleRatAside(context, actor);
  if ((await findCurrentVersionNumber(context.db)) !== null) return;
  const preparing = await findPreparingVersion(context.db);
  if (preparing === null) await freezeNow(context, actor, { label: '1', note: noteOfFirst });
  else await runFreeze(context, preparing.id);
}

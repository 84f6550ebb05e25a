import type { Transaction } from '../../../db/client';
import { insertAudit } from '../../../db/queries/audit';
import { finishFitRun, insertFitRun } from '../../../db/queries/fits';
import { findHoldersOf } from '../../../db/queries/recipients';
import { findCurrentVersionNumber, findEnterersOf, findSourcesByKeys, findVersionById, findVersionEvents, findVersionFiles, findWithdrawnReasons, insertVersionEvent, insertVersionFiles, insertVersionRows, lockVersion, updateVersion, type VersionRow } from '../../../db/queries/versions';
import { recordSerial } from '../../../shared/domain/identifiers';
import { today, type Context } from '../../context';
import { versionTitle } from '../../export/versionFacts';
import { loadVersionRows, loadWorkingRows, type DatasetRow } from '../dataset/rows';
import { computeStandingFits, ensureStandingFits, storeStandingFits } from '../dataset/standingFits';
import { enqueueMails, tell } from '../notify';
import { buildVersionFiles, manifestName } from './buildFiles';
import { compareRows } from './changes';
import { versionFacts } from './facts';
import { standingExponents } from './standingExponents';
import { contributorsOf, countRows, setAsidesOf, versionSummarySchema, type VersionSummary } from './summary';
import { loadVersionFits, loadVersionResults } from './versionFits';

type Step = 'rows-written' | 'fits-written' | 'files-written' | 'frozen';

/** Takes a step once: its rows and its event stand or fall together, and two workers take turns at the version's row. */
async function takeOnce(context: Context, versionId: string, step: Step, work: (tx: Transaction) => Promise<string>): Promise<void> {
  await context.db.transaction(
    async (tx) => {
      if ((await lockVersion(tx, versionId)) !== 'preparing') return;
      if ((await findVersionEvents(tx, versionId)).some((event) => event.step === step)) return;
      const detail = await work(tx);
      await insertVersionEvent(tx, { versionId, step, detail, actorId: null, createdAt: context.clock() });
    },
    // One snapshot: rows, set-asides and re-checks as they stood at one moment.
    { isolationLevel: 'repeatable read' },
  );
}

const counted = (number: number, one: string, many: string): string => `${number} ${number === 1 ? one : many}`;

/** Step 1: every approved record that is neither withdrawn nor under embargo, in order of its number. */
export async function storeRows(context: Context, version: VersionRow): Promise<void> {
  await takeOnce(context, version.id, 'rows-written', async (tx) => {
    const rows = await loadWorkingRows(tx, { today: today(context) });
    await insertVersionRows(tx, version.id, rows.map(({ recordId, recordRevisionId, row }) => ({ recordId, recordRevisionId, number: recordSerial(row.number) ?? 0, row })));
    const demonstration = rows.some(({ row }) => row.demonstration);
    await updateVersion(tx, version.id, { demonstration, title: versionTitle(String(version.number), demonstration) });
    return counted(rows.length, 'record', 'records');
  });
}

/** Step 2: the standing fits over the rows of the version, with their flags. */
export async function storeFits(context: Context, version: VersionRow): Promise<void> {
  await takeOnce(context, version.id, 'fits-written', async (tx) => {
    const rows = await loadVersionRows(tx, version.number);
    const definitions = await ensureStandingFits(tx, rows);
    const runId = await insertFitRun(tx, { set: 'version', versionId: version.id, reason: `version ${version.number}`, touches: [] });
    await storeStandingFits(tx, runId, computeStandingFits(rows, definitions), { set: 'version', versionId: version.id });
    await finishFitRun(tx, runId, context.clock());
    return counted(definitions.length, 'standing fit', 'standing fits');
  });
}

async function whyGone(tx: Transaction, before: readonly DatasetRow[], now: readonly DatasetRow[]): Promise<Map<string, string>> {
  const standing = new Set(now.map(({ recordId }) => recordId));
  const gone = before.filter(({ recordId }) => !standing.has(recordId));
  const reasons = await findWithdrawnReasons(tx, gone.map(({ recordId }) => recordId));
  return new Map(gone.flatMap(({ recordId, row }) => (reasons.has(recordId) ? [[row.number, reasons.get(recordId) ?? ''] as const] : [])));
}

async function summarise(tx: Transaction, version: VersionRow, rows: readonly DatasetRow[]): Promise<VersionSummary> {
  const previousNumber = await findCurrentVersionNumber(tx);
  const before = previousNumber === null ? [] : await loadVersionRows(tx, previousNumber);
  const plain = rows.map(({ row }) => row);
  const previous = previousNumber === null ? null : { label: String(previousNumber), rows: before.map(({ row }) => row) };
  return {
    counts: countRows(plain),
    changes: compareRows(previous, plain, await whyGone(tx, before, rows)),
    contributors: contributorsOf(plain),
    setAside: setAsidesOf(plain),
    standingFits: standingExponents(await loadVersionFits(tx, version.number), await loadVersionResults(tx, previousNumber)),
    previous: previous?.label ?? null,
  };
}

/** The time at which the rows were taken: the date of the version, the same on every attempt. */
async function takenAt(tx: Transaction, versionId: string): Promise<Date> {
  const event = (await findVersionEvents(tx, versionId)).find(({ step }) => step === 'rows-written');
  if (event === undefined) throw new Error('The rows of the version are not written yet.');
  return event.at;
}

/** Step 3: the files, stored under their checksums before the rows that name them are written. */
export async function storeFiles(context: Context, version: VersionRow): Promise<void> {
  await takeOnce(context, version.id, 'files-written', async (tx) => {
    const current = (await findVersionById(tx, version.id)) ?? version;
    const rows = await loadVersionRows(tx, version.number);
    const summary = await summarise(tx, current, rows);
    const plain = rows.map(({ row }) => row);
    const sources = await findSourcesByKeys(tx, [...new Set(plain.map((row) => row.sourceKey))]);
    const facts = versionFacts(current, summary.contributors, await takenAt(tx, version.id));
    const files = buildVersionFiles(facts, summary, plain, await loadVersionFits(tx, version.number), sources);
    const stored = files.map(({ name, mediaType, content, sha256, rows: count }, position) => ({ name, mediaType, bytes: content.length, sha256, storageKey: `versions/${version.number}/${sha256}-${name}`, rows: count, position, content }));
    for (const { storageKey, content, mediaType } of stored) await context.storage.put(storageKey, content, { contentType: mediaType });
    context.killPoint('freeze:files-stored');
    await insertVersionFiles(tx, version.id, stored.map(({ content: _content, ...row }) => row));
    await updateVersion(tx, version.id, { summary });
    return counted(files.length, 'file', 'files');
  });
}

/** People to tell of a frozen version: the curators, and who entered what came in or changed. */
async function peopleToTell(tx: Transaction, version: VersionRow, summary: VersionSummary): Promise<string[]> {
  const changed = new Set([...summary.changes.came, ...summary.changes.revised].map(({ number }) => number));
  const recordIds = (await loadVersionRows(tx, version.number)).filter(({ row }) => changed.has(row.number)).map(({ recordId }) => recordId);
  return [...new Set([...(await findHoldersOf(tx, 'curator')), ...(await findEnterersOf(tx, recordIds))])];
}

/** Step 4: one transaction makes the version the current one, and it never changes again. */
export async function switchCurrent(context: Context, version: VersionRow): Promise<void> {
  const mailIds: string[] = [];
  await takeOnce(context, version.id, 'frozen', async (tx) => {
    const prepared = await findVersionById(tx, version.id);
    const summary = versionSummarySchema.parse(prepared?.summary);
    const manifest = (await findVersionFiles(tx, version.id)).find(({ name }) => name === manifestName);
    if (manifest === undefined) throw new Error('The files of the version are not written yet.');
    const label = String(version.number);
    await updateVersion(tx, version.id, { status: 'frozen', manifestSha256: manifest.sha256, frozenAt: await takenAt(tx, version.id) });
    await insertAudit(tx, { actorId: version.startedById, action: 'version-frozen', targetType: 'version', targetId: label, detail: { sha256: manifest.sha256, records: summary.counts.records } });
    const { came, revised, went } = summary.changes;
    const body = `Version ${label} is frozen: ${counted(summary.counts.records, 'record', 'records')} of ${summary.counts.species} species; ${came.length} came, ${revised.length} changed, ${went.length} went.`;
    mailIds.push(...(await tell(context, tx, { userIds: await peopleToTell(tx, version, summary), kind: 'frozen', subject: `version ${label} is frozen`, body, href: `/versions/${label}`, event: `frozen:${version.id}` })));
    return `SHA-256 ${manifest.sha256}`;
  });
  await enqueueMails(context, mailIds);
}

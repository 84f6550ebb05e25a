import { findFrozenVersions, type FrozenVersion } from '../../../db/queries/rows';
import { entityTag } from '../../frozenAnswer';
import type { Context } from '../../context';
import { notFound } from '../../errors';
import { loadVersionRows, type DatasetRow } from './rows';

/** A frozen version with its rows, as public answers are made from it. */
export interface Published {
  label: string;
  version: FrozenVersion;
  /** The version frozen before it, or null. */
  previous: FrozenVersion | null;
  /** All frozen versions, newest first. */
  versions: readonly FrozenVersion[];
  rows: readonly DatasetRow[];
  /** Whether the asker named the version, so that the answer can never change. */
  explicit: boolean;
}

interface Kept {
  rows: Map<number, readonly DatasetRow[]>;
  answers: Map<string, { answer: unknown; tag: string }>;
}

const keptVersions = 6;
const keptAnswers = 300;
const kept = new WeakMap<Context['db'], Kept>();

function keptOf(context: Context): Kept {
  const known = kept.get(context.db) ?? { rows: new Map(), answers: new Map() };
  kept.set(context.db, known);
  return known;
}

/** Adds to a map that holds at most `most` entries; the oldest goes. */
function keep<Key, Value>(map: Map<Key, Value>, key: Key, value: Value, most: number): Value {
  map.set(key, value);
  const [oldest] = map.keys();
  if (map.size > most && oldest !== undefined) map.delete(oldest);
  return value;
}

/**
 * The version that a public answer speaks of: the one named, else the current one. Rows of a frozen version never
 * change and stay in memory.
 * @param label `version` of the query
 * @returns null where nothing was named and nothing is frozen yet
 * @throws not-found where the label names no frozen version
 */
export async function findPublished(context: Context, label: string | undefined): Promise<Published | null> {
  const versions = await findFrozenVersions(context.db);
  const version = label === undefined ? versions[0] : versions.find(({ number }) => String(number) === label);
  if (version === undefined) {
    if (label !== undefined) throw notFound(`Version ${label}`);
    return null;
  }
  const { rows } = keptOf(context);
  const own = rows.get(version.number) ?? keep(rows, version.number, await loadVersionRows(context.db, version.number), keptVersions);
  return { label: String(version.number), version, previous: versions.find(({ number }) => number < version.number) ?? null, versions, rows: own, explicit: label !== undefined };
}

/** As `findPublished`, where there is nothing to show without a version. */
export async function requirePublished(context: Context, label: string | undefined): Promise<Published> {
  const published = await findPublished(context, label);
  if (published === null) throw notFound('A published version');
  return published;
}

/**
 * Keeps what was computed from a frozen version alone, with its entity tag.
 * @param key names the question, within the version
 */
export async function keepAnswer<Answer>(context: Context, published: Published, key: string, compute: () => Promise<Answer>): Promise<{ answer: Answer; tag: string }> {
  const { answers } = keptOf(context);
  const whole = `${published.version.id} ${key}`;
  const known = answers.get(whole);
  if (known !== undefined) return known as { answer: Answer; tag: string };
  const answer = await compute();
  const made = { answer, tag: entityTag(answer) };
  keep(answers, whole, made, keptAnswers);
  return made;
}

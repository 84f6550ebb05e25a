import { performance } from 'node:perf_hooks';
import { estimateSample } from '../shared/domain/sampleEstimate';
import { fitScaling } from '../shared/stats/fit';

/**
 * Measures what a person waits for. The first rows need nothing but this machine; the rest are asked of a running
 * register (BENCH_URL, by default http://127.0.0.1:4680) and left out where none answers.
 */

const url = (process.env['BENCH_URL'] ?? 'http://127.0.0.1:4680').replace(/\/+$/, '');

interface Row {
  what: string;
  figure: string;
}

/** A small generator with a fixed seed, so that two runs measure the same points (mulberry32). */
function seeded(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4_294_967_296;
  };
}

function makePoints(n: number): { id: string; x: number; y: number }[] {
  const random = seeded(n);
  return Array.from({ length: n }, (_, index) => {
    const log10X = 6 + 4 * random();
    const noise = (random() + random() + random() + random() - 2) * 0.2;
    return { id: `species ${index}`, x: 10 ** log10X, y: 10 ** (1.5 * log10X - 11 + noise) };
  });
}

const milliseconds = (value: number): string => `${value < 10 ? value.toFixed(2) : value.toFixed(0)} ms`;

/** Middle and slowest of repeated calls; the first one warms up and is not counted. */
async function timed(times: number, call: (index: number) => unknown): Promise<{ middle: number; slowest: number }> {
  await call(-1);
  const spent: number[] = [];
  for (let index = 0; index < times; index += 1) {
    const from = performance.now();
    await call(index);
    spent.push(performance.now() - from);
  }
  spent.sort((a, b) => a - b);
  return { middle: spent[Math.floor(spent.length / 2)] ?? NaN, slowest: spent.at(-1) ?? NaN };
}

const shown = ({ middle, slowest }: { middle: number; slowest: number }): string => `${milliseconds(middle)} (slowest ${milliseconds(slowest)})`;

async function computing(): Promise<Row[]> {
  const rows: Row[] = [];
  for (const n of [100, 1_000, 5_000]) {
    const points = makePoints(n);
    const result = await timed(n > 1_000 ? 5 : 10, () => fitScaling({ points, method: 'ols', against: [1] }));
    rows.push({ what: `least squares with diagnostics and flags, ${n.toLocaleString('en')} points`, figure: shown(result) });
  }
  const sample = { tissueMassG: 0.8, suspensionVolumeMl: 12, dilution: 2, aliquots: [412, 388, 401, 427].map((nuclei) => ({ nuclei, volumeMl: 4e-4 })), neun: { positive: 260, total: 520 } };
  const calls = 2_000;
  const { middle } = await timed(5, () => {
    for (let call = 0; call < calls; call += 1) estimateSample(sample);
  });
  rows.push({ what: 'estimates of one sample', figure: `${Math.round((calls / middle) * 1_000).toLocaleString('en')} a second` });
  return rows;
}

async function call(path: string, body?: unknown): Promise<void> {
  const answer = await fetch(`${url}/api/v1${path}`, body === undefined ? {} : { method: 'POST', headers: { 'content-type': 'application/json' }, body: JSON.stringify(body) });
  await answer.arrayBuffer();
  if (!answer.ok) throw new Error(`${path} answered ${answer.status}.`);
}

async function asking(): Promise<Row[]> {
  const question = '/scaling?x=neurons&xStructure=cerebral_cortex&y=structureMassG&yStructure=cerebral_cortex&clades=rodentia,primates,afrotheria';
  // A level that nobody asked for before is a question that is not kept yet.
  const fresh = 0.9 + (Date.now() % 90_000) / 1_000_000;
  const points = makePoints(5_000);
  const estimate = { suspensionVolumeMl: 12, aliquots: [{ nuclei: 412, volumeMl: 4e-4 }, { nuclei: 388, volumeMl: 4e-4 }] };
  const estimates = 50;
  const perSecond = await timed(2, async () => {
    for (let index = 0; index < estimates; index += 1) await call('/samples/estimate', estimate);
  });
  return [
    { what: 'GET /scaling, a question asked for the first time', figure: shown(await timed(10, (index) => call(`${question}&level=${fresh + (index + 2) * 1e-8}`))) },
    { what: 'GET /scaling, a question kept in memory', figure: shown(await timed(30, () => call(question))) },
    { what: 'GET /species', figure: shown(await timed(10, () => call('/species?limit=200'))) },
    { what: 'GET /register', figure: shown(await timed(10, () => call('/register'))) },
    { what: 'POST /fits, 5,000 points (the most allowed)', figure: shown(await timed(5, () => call('/fits', { points }))) },
    { what: 'POST /samples/estimate, one after the other', figure: `${Math.round((estimates / perSecond.middle) * 1_000).toLocaleString('en')} a second` },
  ];
}

function print(rows: readonly Row[]): void {
  const width = Math.max(...rows.map(({ what }) => what.length));
  for (const { what, figure } of rows) console.log(`${what.padEnd(width)}  ${figure}`);
}

const answers = await fetch(`${url}/api/v1/health`).then((answer) => answer.ok, () => false);
const rows = [...(await computing()), ...(answers ? await asking() : [])];
print(rows);
if (!answers) console.log(`No register answers at ${url}: start it with npm start to measure the pages too.`);

import { existsSync, mkdirSync, readFileSync, readdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { dataFolder, root } from './paths.mjs';
import { runLogged, tail } from './steps.mjs';

/** The parts of a test run: each answers { passed, failed, words }, words being what to show of a failure. */

const logs = join(dataFolder, 'test');
const bin = (name) => join(root, 'node_modules', '.bin', name);

function sourceFolders() {
  return ['app', 'components', 'server', 'db', 'shared', 'scripts'].filter((folder) => existsSync(join(root, folder)));
}

function hasTests(folder) {
  return existsSync(join(root, folder)) && readdirSync(join(root, folder), { recursive: true }).some((name) => /\.(test|spec)\.tsx?$/.test(name));
}

/** A command that passes or fails as a whole counts as one check. */
async function oneCheck(name, command, args) {
  const log = join(logs, `${name}.log`);
  const code = await runLogged(command, args, { log });
  return code === 0 ? { passed: 1, failed: 0, words: '' } : { passed: 0, failed: 1, words: tail(log, 80) };
}

function readReport(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return undefined;
  }
}

function countVitest(report) {
  const passed = report.numPassedTests;
  // A file that fails before its first test has no failed test to count, so it counts itself.
  const silentFiles = report.testResults.filter((file) => file.status === 'failed' && !file.assertionResults.some(({ status }) => status === 'failed')).length;
  // A skipped test has not been run, and an unfinished one neither.
  const failed = report.numFailedTests + silentFiles + report.numPendingTests + (report.numTodoTests ?? 0);
  return { passed, failed };
}

async function vitest(project, env) {
  const report = join(logs, `${project}.json`);
  const log = join(logs, `${project}.log`);
  rmSync(report, { force: true });
  const code = await runLogged(bin('vitest'), ['run', '--project', project, '--reporter=default', '--reporter=json', `--outputFile.json=${report}`], { log, env: { ...process.env, NO_COLOR: '1', ...env } });
  return settle(code, readReport(report), countVitest, log);
}

function countPlaywright(report) {
  const { expected, unexpected, flaky, skipped } = report.stats;
  return { passed: expected, failed: unexpected + flaky + skipped + (report.errors?.length ?? 0) };
}

async function browser(env) {
  const report = join(logs, 'browser.json');
  const log = join(logs, 'browser.log');
  rmSync(report, { force: true });
  const code = await runLogged(bin('playwright'), ['test', '--reporter=list,json'], { log, env: { ...process.env, FORCE_COLOR: '0', PLAYWRIGHT_JSON_OUTPUT_NAME: report, ...env } });
  return settle(code, readReport(report), countPlaywright, log);
}

/** A part that ended badly, or without a single test, has failed even where no test says so. */
function settle(code, report, count, log) {
  const counted = report === undefined ? { passed: 0, failed: 0 } : count(report);
  const wrong = counted.failed > 0 || code !== 0 || counted.passed === 0;
  return { passed: counted.passed, failed: wrong ? Math.max(1, counted.failed) : 0, words: wrong ? tail(log, 150) : '' };
}

export function partsOfTheRun(env) {
  mkdirSync(logs, { recursive: true });
  const parts = [
    { name: 'typecheck', run: () => oneCheck('typecheck', process.execPath, ['scripts/typecheck.mjs']) },
    { name: 'lint', run: () => oneCheck('lint', bin('eslint'), ['.']) },
    { name: 'imports', run: () => oneCheck('imports', bin('depcruise'), ['--config', '.dependency-cruiser.cjs', ...sourceFolders()]) },
    { name: 'unit', run: () => vitest('unit', env) },
  ];
  if (hasTests('tests/components')) parts.push({ name: 'client', run: () => vitest('client', env) });
  parts.push({ name: 'server', run: () => vitest('server', env) }, { name: 'browser', needsClient: true, run: () => browser(env) });
  return parts;
}

import { existsSync, mkdirSync, readFileSync, readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { StopError, capture } from './steps.mjs';
import { installFromDebian, isRoot } from './debian.mjs';

const debianHome = '/usr/lib/postgresql';
const holdsPostgres = (folder) => existsSync(join(folder, 'initdb')) && existsSync(join(folder, 'pg_ctl'));

/** `wantedMajor` is the version that made an existing cluster: only the same one can open it. */
async function findBinaries(wantedMajor) {
  if (process.env.PG_BIN) {
    if (!holdsPostgres(process.env.PG_BIN)) throw new StopError(`PG_BIN is "${process.env.PG_BIN}", but no initdb and pg_ctl are there.`);
    return process.env.PG_BIN;
  }
  const majors = existsSync(debianHome) ? readdirSync(debianHome).filter((entry) => holdsPostgres(join(debianHome, entry, 'bin'))) : [];
  majors.sort((a, b) => Number(b) - Number(a));
  const major = wantedMajor === undefined ? majors[0] : majors.find((entry) => entry === wantedMajor);
  if (major !== undefined) return join(debianHome, major, 'bin');
  const configured = await capture('pg_config', ['--bindir']);
  const folder = configured.stdout.trim();
  return configured.code === 0 && holdsPostgres(folder) ? folder : undefined;
}

/** Debian's package would make a cluster on 5432 and start it at every boot; ours is the only one wanted. */
function keepDebianFromMakingACluster() {
  const folder = '/etc/postgresql-common';
  const file = join(folder, 'createcluster.conf');
  mkdirSync(folder, { recursive: true });
  const before = existsSync(file) ? readFileSync(file, 'utf8') : '';
  if (!/^\s*create_main_cluster\s*=\s*false/m.test(before)) writeFileSync(file, `${before.trimEnd()}\ncreate_main_cluster = false\n`);
}

/** The folder of initdb and pg_ctl, installed from Debian's packages if absent. */
export async function ensurePostgres(wantedMajor) {
  const found = await findBinaries(wantedMajor);
  if (found !== undefined) return { folder: found, installed: false };
  const purpose = wantedMajor === undefined ? 'PostgreSQL is needed' : `The database was made by PostgreSQL ${wantedMajor}, which is needed to open it`;
  const server = wantedMajor === undefined ? 'postgresql' : `postgresql-${wantedMajor}`;
  if (isRoot()) {
    await installFromDebian(purpose, ['postgresql-common']);
    keepDebianFromMakingACluster();
  }
  await installFromDebian(purpose, [server]);
  const folder = await findBinaries(wantedMajor);
  if (folder === undefined) throw new StopError(`${purpose}: it was installed, yet initdb is in none of ${debianHome}/*/bin; set PG_BIN to its folder.`);
  return { folder, installed: true };
}

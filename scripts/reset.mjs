import { rmSync } from 'node:fs';
import { clusterPlaces, stopLeftover } from './cluster.mjs';
import { liveUsers, withLock } from './lock.mjs';
import { buildFolder, dataFolder, registerCluster, testCluster } from './paths.mjs';
import { StopError, reportAndExit } from './steps.mjs';

/** `npm run reset`: removes the database, the stored objects, mails and logs of this checkout. */
async function reset() {
  await withLock('postgres', () =>
    withLock('test-postgres', async () => {
      const users = [...liveUsers('register'), ...liveUsers('postgres'), ...liveUsers('test-postgres')];
      if (users.length > 0) throw new StopError(`The register or its tests are running (process ${[...new Set(users)].join(', ')}): stop them first, then type npm run reset again.`);
      for (const place of [...(await clusterPlaces(registerCluster)), ...(await clusterPlaces(testCluster))]) {
        await stopLeftover(place);
        rmSync(place, { recursive: true, force: true });
      }
    }),
  );
  for (const folder of [dataFolder, buildFolder]) rmSync(folder, { recursive: true, force: true });
  console.log('The database and the stored files of this checkout are gone; npm start makes them anew.');
}

reset().catch(reportAndExit);

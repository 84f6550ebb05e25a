import { appendFileSync } from 'node:fs';

/**
 * Lets the process die by SIGKILL when it reaches the named point, having first written the name to the
 * file given by KARYA_KILL_LOG, so that a test can prove that the point was reached.
 */
export function createKillPoint(killAt: string | undefined, logFile: string | undefined): (name: string) => void {
  if (killAt === undefined) return () => undefined;
  return (name) => {
    if (name !== killAt) return;
    if (logFile !== undefined) appendFileSync(logFile, `${name}\n`);
    process.kill(process.pid, 'SIGKILL');
  };
}

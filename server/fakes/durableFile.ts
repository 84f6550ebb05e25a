import { randomUUID } from 'node:crypto';
import { open, rename } from 'node:fs/promises';
import { dirname } from 'node:path';

/**
 * Writes a file so that a power cut or kill leaves the old content or the new, never half: to a
 * neighbouring name, forced to disk, renamed, and the folder forced to disk too.
 */
export async function writeDurably(path: string, content: Buffer | string): Promise<void> {
  const making = `${path}.${randomUUID()}.new`;
  const file = await open(making, 'w');
  try {
    await file.writeFile(content);
    await file.sync();
  } finally {
    await file.close();
  }
  await rename(making, path);
  const folder = await open(dirname(path), 'r');
  try {
    await folder.sync();
  } finally {
    await folder.close();
  }
}

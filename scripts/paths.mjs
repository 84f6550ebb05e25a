import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** Places of this checkout; everything that starting and testing write lies in four ignored folders. */
export const root = dirname(dirname(fileURLToPath(import.meta.url)));
export const dataFolder = join(root, '.data');
export const buildFolder = join(root, '.build');
export const webFolder = join(root, 'dist');
export const registerCluster = join(root, '.postgres');
export const testCluster = join(dataFolder, 'test-postgres');
export const lockFolder = join(dataFolder, 'locks');

import type { Route } from '../routing';
import { healthRoutes } from './health';

/** Every endpoint of the API. A test walks this list and fails where the role table has no row for one. */
export const routes: readonly Route[] = [...healthRoutes];

import type { Route } from '../routing';
import { calculatorRoutes } from './calculators';
import { healthRoutes } from './health';

/** Every endpoint of the API. A test walks this list and fails where the role table has no row for one. */
export const routes: readonly Route[] = [...healthRoutes, ...calculatorRoutes];

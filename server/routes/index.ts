import type { Route } from '../routing';
import { auditRoutes } from './audit';
import { calculatorRoutes } from './calculators';
import { curateRoutes } from './curate';
import { healthRoutes } from './health';
import { labRoutes } from './labs';
import { meRoutes } from './me';
import { outboxRoutes } from './outbox';
import { peopleRoutes } from './people';
import { recheckRoutes } from './rechecks';
import { recordRoutes } from './records';
import { registerRoutes } from './register';
import { reviewRoutes } from './review/review';
import { scalingRoutes } from './scaling';
import { speciesRoutes } from './species';
import { attachmentRoutes } from './submissions/attachments';
import { submissionCollectionRoutes } from './submissions/collection';
import { submissionRoutes } from './submissions/submission';
import { taxonRoutes } from './taxa';
import { versionRoutes } from './versions';
import { vocabularyRoutes } from './vocabularies';

/** Every endpoint of the API. A test walks this list and fails where the role table has no row for one. */
export const routes: readonly Route[] = [...healthRoutes, ...calculatorRoutes, ...scalingRoutes, ...speciesRoutes, ...recordRoutes, ...registerRoutes, ...meRoutes, ...peopleRoutes, ...labRoutes, ...auditRoutes, ...outboxRoutes, ...taxonRoutes, ...vocabularyRoutes, ...recheckRoutes, ...submissionCollectionRoutes, ...submissionRoutes, ...attachmentRoutes, ...reviewRoutes, ...versionRoutes, ...curateRoutes];

import { accountRoutes } from './accounts';
import { diagnosisRoutes } from './diagnoses';
import { healthRoutes } from './health';
import { layoutVersionRoutes } from './layout-versions';
import { layoutRoutes } from './layouts';
import { meRoutes } from './me';
import { openapiRoutes } from './openapi';
import { peopleRoutes } from './people';
import { problemRoutes } from './problems';
import { reviewRoutes } from './reviews';
import { roleRequestRoutes } from './role-requests';
import { sessionRoutes } from './sessions';
import type { Route } from '@/server/http/route';

const described: readonly Route[] = [
  ...healthRoutes,
  ...problemRoutes,
  ...accountRoutes,
  ...sessionRoutes,
  ...meRoutes,
  ...peopleRoutes,
  ...roleRequestRoutes,
  ...diagnosisRoutes,
  ...layoutRoutes,
  ...layoutVersionRoutes,
  ...reviewRoutes,
];

/** Every route of the API, under /api/v1. */
export const routes: readonly Route[] = [...described, ...openapiRoutes(() => routes)];

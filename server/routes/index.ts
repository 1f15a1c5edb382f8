import { accountRoutes } from './accounts';
import { healthRoutes } from './health';
import { layoutVersionRoutes } from './layout-versions';
import { layoutRoutes } from './layouts';
import { meRoutes } from './me';
import { peopleRoutes } from './people';
import { problemRoutes } from './problems';
import { reviewRoutes } from './reviews';
import { roleRequestRoutes } from './role-requests';
import { sessionRoutes } from './sessions';
import type { Route } from '@/server/http/route';

/** Every route of the API, under /api/v1. */
export const routes: readonly Route[] = [
  ...healthRoutes,
  ...problemRoutes,
  ...accountRoutes,
  ...sessionRoutes,
  ...meRoutes,
  ...peopleRoutes,
  ...roleRequestRoutes,
  ...layoutRoutes,
  ...layoutVersionRoutes,
  ...reviewRoutes,
];

import { healthRoutes } from './health';
import { problemRoutes } from './problems';
import type { Route } from '@/server/http/route';

/** Every route of the API, under /api/v1. */
export const routes: readonly Route[] = [...healthRoutes, ...problemRoutes];

import type { Route } from '../http/route';
import type { Context } from '../services/context';
import { accountRoutes } from './account-routes';
import { sheetRoutes } from './sheet-routes';
import { teamRoutes } from './team-routes';

/** Every route under /api; a test asks each of them as each role. */
export function allRoutes(ctx: Context): Route[] {
  return [...accountRoutes(ctx), ...teamRoutes(ctx), ...sheetRoutes(ctx)];
}

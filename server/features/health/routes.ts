import { healthApi } from '#shared/contracts/health.ts';
import { type Route, route } from '../../platform/http.ts';

/** `document` gives the API document; it is made of all routes, these two included, hence a function. */
export function healthRoutes(document: () => object): Route[] {
  return [
    route(healthApi.get, async (ctx) => {
      await ctx.services.database.reader('shops').first('id');
      return { status: 'ok' as const };
    }),
    route(healthApi.document, async () => ({ ...document() })),
  ];
}

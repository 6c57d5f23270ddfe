import type { MiddlewareHandler } from 'astro';

/** Who may open which page. What is not listed is refused: a test walks src/pages and compares. */

export type RouteAccess = 'public';

export const routeAccess: Readonly<Record<string, RouteAccess>> = {
  '/': 'public',
  '/404': 'public',
  '/500': 'public',
  '/materials': 'public',
  '/materials/[slug]': 'public',
  '/api/health': 'public',
  '/api/v1/estimates': 'public',
  '/api/v1/materials': 'public',
  '/api/v1/materials/[slug]': 'public',
  '/api/v1/materials/[slug]/measurements': 'public',
};

/** An answer without a body and status 404 makes Astro draw the page for it. */
export const requireListedRoute: MiddlewareHandler = ({ routePattern, locals }, next) => {
  if (Object.hasOwn(routeAccess, routePattern)) return next();
  locals.log.warn({ routePattern }, 'refused: the route is not listed in route-access.ts');
  return Promise.resolve(new Response(null, { status: 404 }));
};

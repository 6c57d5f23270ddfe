import type { MiddlewareHandler } from 'astro';

const safeMethods = new Set(['GET', 'HEAD', 'OPTIONS']);
const formTypes = ['application/x-www-form-urlencoded', 'multipart/form-data', 'text/plain'];

function couldBeForm(contentType: string | null): boolean {
  return contentType === null || formTypes.some((type) => contentType.toLowerCase().includes(type));
}

/**
 * Refuses what another site's form could send to a page: any unsafe method with a content type that forms have (or
 * none), unless it comes from our own origin. The JSON API takes no such content type and says so itself (415); once it
 * knows cookies, writes with a cookie need this too.
 */
export const sameOrigin: MiddlewareHandler = ({ request, url, isPrerendered }, next) => {
  const isApi = url.pathname.startsWith('/api/');
  if (isPrerendered || isApi || safeMethods.has(request.method)) return next();
  const isOurs = request.headers.get('origin') === url.origin;
  if (isOurs || !couldBeForm(request.headers.get('content-type'))) return next();
  return Promise.resolve(
    new Response(
      'This form was sent from another site and was refused. Open the page here and send it again.\n',
      {
        status: 403,
        headers: { 'content-type': 'text/plain; charset=utf-8' },
      },
    ),
  );
};

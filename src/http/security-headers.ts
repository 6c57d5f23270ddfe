import type { MiddlewareHandler } from 'astro';

/** Headers that tell browsers what an answer may do. */

const everywhere: Readonly<Record<string, string>> = {
  'x-content-type-options': 'nosniff',
  'referrer-policy': 'strict-origin-when-cross-origin',
  'permissions-policy': 'camera=(), geolocation=(), microphone=(), payment=(), usb=()',
  'cross-origin-opener-policy': 'same-origin',
};

/** Nobody frames us, forms come back to us, no plug-ins, no foreign base. A meta element cannot say the first. */
const framing: readonly (readonly [string, string])[] = [
  ['frame-ancestors', "'none'"],
  ['base-uri', "'self'"],
  ['form-action', "'self'"],
  ['object-src', "'none'"],
];

/** Everything a page loads comes from here. */
const loading: readonly (readonly [string, string])[] = [
  ['default-src', "'self'"],
  ['img-src', "'self' data: blob:"],
];

/** Adds directives that a policy does not have yet; what it has stays as it is. */
function addDirectives(policy: string, directives: readonly (readonly [string, string])[]): string {
  const parts = policy
    .split(';')
    .map((part) => part.trim())
    .filter((part) => part !== '');
  const present = new Set(parts.map((part) => part.split(/\s+/)[0]?.toLowerCase()));
  const added = directives.filter(([name]) => !present.has(name)).map(([name, value]) => `${name} ${value}`);
  return [...parts, ...added].join('; ');
}

/**
 * Astro sends the policy of a page it renders (hashes of its own scripts and styles) as the header
 * `content-security-policy`; its development server sends none, because Vite needs inline scripts. What the hashes do
 * not cover is added: in development only what does not hinder Vite.
 */
function contentSecurityPolicy(response: Response): string {
  const isPage = response.headers.get('content-type')?.startsWith('text/html') ?? false;
  if (!isPage) return "default-src 'none'; frame-ancestors 'none'";
  const ofAstro = response.headers.get('content-security-policy');
  return ofAstro === null ? addDirectives('', framing) : addDirectives(ofAstro, [...loading, ...framing]);
}

export const securityHeaders: MiddlewareHandler = async (_context, next) => {
  const response = await next();
  for (const [name, value] of Object.entries(everywhere)) response.headers.set(name, value);
  response.headers.set('content-security-policy', contentSecurityPolicy(response));
  return response;
};

import { defineConfig } from 'astro/config';
import node from '@astrojs/node';
import react from '@astrojs/react';
import tailwind from '@astrojs/tailwind';

/**
 * Form posts are accepted only for hosts named here. Astro reads this while building,
 * so `npm start` builds again when PUBLIC_ORIGIN changes.
 */
const publicOrigin = process.env.PUBLIC_ORIGIN ? new URL(process.env.PUBLIC_ORIGIN) : undefined;
const allowedDomains = [
  { hostname: 'localhost' },
  { hostname: '127.0.0.1' },
  ...(publicOrigin
    ? [{ protocol: publicOrigin.protocol.replace(':', ''), hostname: publicOrigin.hostname }]
    : []),
];

export default defineConfig({
  output: 'server',
  adapter: node({ mode: 'standalone' }),
  integrations: [react(), tailwind({ applyBaseStyles: false })],
  // Astro's own check answers before any middleware, in plain text and also under /api, where a failure is a problem
  // document. src/http/same-origin.ts makes the same check for everything but the JSON API, which takes no form.
  security: { checkOrigin: false, allowedDomains },
  experimental: { csp: true },
  devToolbar: { enabled: false },
  ...(publicOrigin ? { site: publicOrigin.origin } : {}),
  vite: { ssr: { noExternal: ['zod'] } },
});

// `npm run dev`: the database of `npm start`, and Astro's development server on top.
import process from 'node:process';
import { reportFailure } from './setup/failure.mjs';
import { requireSupportedNode } from './setup/node-version.mjs';

try {
  requireSupportedNode(process.versions.node);
} catch (error) {
  reportFailure(error);
  process.exit(1);
}
// Loaded only now: an older Node.js would fail on these with a stack trace.
const { serve } = await import('./setup/serve.mjs');
await serve('development');

/// <reference types="vitest/config" />
import { getViteConfig } from 'astro/config';

/** Layouts and pages rendered through Astro's container need Astro's own Vite pipeline. */
export default getViteConfig({
  test: { name: 'component', include: ['tests/component/**/*.test.ts'], environment: 'node' },
});

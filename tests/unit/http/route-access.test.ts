import { readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { routeAccess } from '#src/http/route-access.ts';

/** src/pages/materials/[slug].astro → /materials/[slug], as Astro names the route. */
function patternOf(file: string): string {
  const path = file
    .replaceAll('\\', '/')
    .replace(/\.(astro|ts|md|mdx)$/, '')
    .replace(/(^|\/)index$/, '');
  return `/${path}`;
}

const files = readdirSync('src/pages', { recursive: true, encoding: 'utf8' }).filter((file) =>
  /\.(astro|ts|md|mdx)$/.test(file),
);

describe('the list of routes', () => {
  it.each(files.map(patternOf))('says who may open %s', (pattern) => {
    expect(Object.keys(routeAccess)).toContain(pattern);
  });

  it('names no route that is gone', () => {
    expect(Object.keys(routeAccess).toSorted()).toEqual(files.map(patternOf).toSorted());
  });
});

import { readFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import { version } from '#src/lib/version.ts';

it('the program reports the version that package.json has', () => {
  const packageJson: unknown = JSON.parse(readFileSync('package.json', 'utf8'));
  expect(packageJson).toMatchObject({ version });
});

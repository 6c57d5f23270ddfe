import tseslint from 'typescript-eslint';
import astro from 'eslint-plugin-astro';
import jsxA11y from 'eslint-plugin-jsx-a11y';
import reactHooks from 'eslint-plugin-react-hooks';
import drizzle from 'eslint-plugin-drizzle';

/** One direction of dependency: each folder may import only the folders named for it (DEVELOPERS.md). */
const layers = {
  physics: ['physics'],
  lib: ['lib'],
  schemas: ['schemas', 'physics', 'lib'],
  db: ['db', 'lib', 'schemas'],
  auth: ['auth', 'db', 'lib'],
  services: ['services', 'db', 'physics', 'schemas', 'auth', 'lib'],
  http: ['http', 'services', 'schemas', 'auth', 'lib'],
  pages: ['pages', 'services', 'schemas', 'auth', 'http', 'lib', 'layouts', 'components', 'styles'],
  layouts: ['layouts', 'components', 'schemas', 'http', 'lib', 'styles'],
  components: ['components', 'schemas', 'lib', 'physics'],
  cli: ['cli', 'services', 'db', 'schemas', 'physics', 'lib'],
};
const everyFolder = Object.keys(layers).concat('actions', 'jobs', 'styles');

const layerRules = Object.entries(layers).map(([folder, allowed]) => ({
  files: [`src/${folder}/**/*.{ts,tsx,astro}`],
  rules: {
    'no-restricted-imports': [
      'error',
      {
        patterns: [
          { regex: '^\\.\\./', message: 'Import across folders as #src/<folder>/….ts.' },
          {
            regex: `^#src/(${everyFolder.filter((name) => !allowed.includes(name)).join('|')})(/|$)`,
            message: `src/${folder} may import only ${allowed.map((name) => `src/${name}`).join(', ')}.`,
          },
          ...(folder === 'physics'
            ? [{ regex: '^(?!\\./|#src/physics/)', message: 'The physics core imports nothing.' }]
            : []),
          ...(folder === 'components'
            ? [
                { regex: '^node:', message: 'Components also run in the browser.' },
                {
                  regex: '^#src/physics/(?!units\\.ts$|constants\\.ts$)',
                  allowTypeImports: true,
                  message: 'Estimates are made on the server; components take units and types.',
                },
              ]
            : []),
          ...(folder === 'services'
            ? [{ regex: '^astro(:|$)', message: 'Services know nothing of requests and pages.' }]
            : []),
        ],
      },
    ],
  },
}));

export default tseslint.config(
  { ignores: ['dist/', 'node_modules/', '.astro/', '.data/', '.look/', '.test-reports/', 'tests/fixtures/'] },
  {
    files: ['**/*.{ts,tsx}'],
    extends: [...tseslint.configs.strictTypeChecked],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    rules: {
      '@typescript-eslint/explicit-module-boundary-types': 'error',
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_' }],
      '@typescript-eslint/switch-exhaustiveness-check': 'error',
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
    },
  },
  { files: ['**/*.{js,mjs}'], extends: [...tseslint.configs.recommended] },
  ...astro.configs['flat/recommended'],
  ...astro.configs['flat/jsx-a11y-strict'],
  {
    files: ['src/components/**/*.tsx'],
    // eslint-plugin-astro has registered jsx-a11y for all files already.
    languageOptions: jsxA11y.flatConfigs.strict.languageOptions,
    plugins: { 'react-hooks': reactHooks },
    rules: { ...jsxA11y.flatConfigs.strict.rules, ...reactHooks.configs.recommended.rules },
  },
  {
    files: ['src/{db,services,cli}/**/*.ts'],
    plugins: { drizzle },
    rules: {
      'drizzle/enforce-delete-with-where': ['error', { drizzleObjectName: ['db', 'tx'] }],
      'drizzle/enforce-update-with-where': ['error', { drizzleObjectName: ['db', 'tx'] }],
    },
  },
  {
    // Drizzle infers the types of columns and tables; written out they would repeat the schema, and drift from it.
    files: ['src/db/schema/**/*.ts'],
    rules: { '@typescript-eslint/explicit-module-boundary-types': 'off' },
  },
  ...layerRules,
  // The browser-safe schemas folder is checked by bundling; console belongs to scripts and the command line.
  { files: ['src/**/*.{ts,tsx,astro}'], ignores: ['src/cli/**'], rules: { 'no-console': 'error' } },
);

import js from '@eslint/js';
import reactHooks from 'eslint-plugin-react-hooks';
import tseslint from 'typescript-eslint';

// Patterns on `#…` names must be regexes: a glob that starts with # is read as a comment.
const forbid = (...patterns) => [
  'error',
  { patterns: patterns.map(([regex, message]) => ({ regex, message })) },
];

const never = [
  ['^#tests/', 'Nothing imports tests.'],
  ['^(\\.\\./){2,}', 'Climb at most one folder; use #common, #server or #client.'],
];
const noServer = ['^#server/', 'The client never imports the server.'];
const noClient = ['^#client/', 'The server never imports the client.'];
const noFramework = [
  '^(@nestjs/|drizzle-orm|pg$|node:|react|three|express)',
  'A pure core knows no framework and no Node built-in.',
];

export default tseslint.config(
  {
    ignores: ['node_modules/', 'dist/', '.data/', '.cache/', 'drizzle/migrations/', 'coverage/'],
  },
  js.configs.recommended,
  {
    files: ['**/*.{ts,tsx}'],
    extends: [...tseslint.configs.recommendedTypeChecked],
    languageOptions: {
      parserOptions: {
        project: ['./server/tsconfig.json', './client/tsconfig.json', './tests/tsconfig.json'],
        tsconfigRootDir: new URL('..', import.meta.url).pathname,
      },
    },
    rules: {
      curly: 'error',
      eqeqeq: 'error',
      'no-console': 'error',
      'no-restricted-imports': forbid(...never),
      'max-lines': ['error', { max: 400 }],
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-non-null-assertion': 'off',
      '@typescript-eslint/switch-exhaustiveness-check': [
        'error',
        { considerDefaultExhaustiveForUnions: true },
      ],
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_' },
      ],
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
      '@typescript-eslint/no-misused-promises': [
        'error',
        { checksVoidReturn: { attributes: false } },
      ],
      '@typescript-eslint/unbound-method': 'off',
      // Nest's fluent mocks and drizzle's builders return thenables we return on purpose.
      '@typescript-eslint/require-await': 'off',
    },
  },
  {
    files: ['common/**/*.ts'],
    rules: {
      'no-restricted-imports': forbid(...never, noServer, noClient, noFramework, [
        '^(?!zod$|#common/|\\./|\\.\\./|mathjs(/|$)|vitest$|fast-check$)',
        'common imports zod and common only.',
      ]),
    },
  },
  {
    files: ['common/**/*.ts'],
    ignores: ['common/expressions/**'],
    rules: {
      'no-restricted-imports': forbid(...never, noServer, noClient, noFramework, [
        '^(?!zod$|#common/|\\./|\\.\\./|vitest$|fast-check$|node:(?!.)).',
        'common imports zod and common only.',
      ]),
    },
  },
  {
    files: ['server/src/**/*.ts'],
    rules: {
      'no-restricted-imports': forbid(...never, noClient),
      // Dependency injection needs the class at run time.
      '@typescript-eslint/consistent-type-imports': 'off',
    },
  },
  {
    files: ['server/src/**/*.ts'],
    ignores: [
      '**/*.repository.ts',
      '**/*.table.ts',
      '**/*.test.ts',
      'server/src/database/**',
      'server/src/demo/**',
    ],
    rules: {
      'no-restricted-imports': forbid(...never, noClient, [
        '^(drizzle-orm|pg$)',
        'Only repositories, tables and database/ know the database.',
      ]),
    },
  },
  {
    files: [
      'server/src/electrostatics/engine/**/*.ts',
      'server/src/energetics/engine/**/*.ts',
      'server/src/cif/format/**/*.ts',
      'server/src/electrostatics/results/**/*.ts',
    ],
    ignores: ['**/*.test.ts'],
    rules: {
      'no-restricted-imports': forbid(...never, noClient, noFramework),
      'no-restricted-properties': [
        'error',
        { object: 'Math', property: 'random', message: 'A pure core is a function of its input.' },
        { object: 'Date', property: 'now', message: 'A pure core knows no clock.' },
      ],
      'max-lines': ['error', { max: 600 }],
    },
  },
  {
    files: ['client/src/**/*.{ts,tsx}'],
    extends: [reactHooks.configs.flat['recommended-latest']],
    rules: {
      'no-restricted-imports': forbid(...never, noServer),
      '@typescript-eslint/consistent-type-imports': 'error',
    },
  },
  {
    files: ['client/src/scene/model/**/*.ts', 'client/src/scene/raster/raster*.ts'],
    ignores: ['**/*.test.ts'],
    rules: {
      'no-restricted-imports': forbid(...never, noServer, [
        '^(react|three|@react-three)',
        'The scene model is plain data.',
      ]),
    },
  },
  {
    // three's objects are mutated in the frame loop on purpose; the compiler's rules forbid that.
    files: ['client/src/scene/**/*.{ts,tsx}'],
    rules: { 'react-hooks/immutability': 'off' },
  },
  {
    files: ['client/src/scene/raster/*.ts'],
    rules: { 'max-lines': ['error', { max: 600 }] },
  },
  {
    files: ['**/*.test.{ts,tsx}', 'tests/**/*.ts'],
    rules: {
      'max-lines': ['error', { max: 500 }],
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-argument': 'off',
      '@typescript-eslint/no-unsafe-return': 'off',
      '@typescript-eslint/no-unsafe-call': 'off',
    },
  },
  {
    files: ['**/*.test.{ts,tsx}', 'tests/**/*.ts'],
    rules: { 'no-restricted-imports': forbid(never[1]) },
  },
  {
    files: ['server/src/command-line/**', 'server/src/main.ts', 'tests/bench/**/*.ts'],
    rules: { 'no-console': 'off' },
  },
  {
    files: ['**/*.{js,mjs,cjs}'],
    extends: [tseslint.configs.disableTypeChecked],
    languageOptions: {
      globals: {
        process: 'readonly',
        console: 'readonly',
        URL: 'readonly',
        setTimeout: 'readonly',
        clearTimeout: 'readonly',
        setInterval: 'readonly',
        clearInterval: 'readonly',
        Buffer: 'readonly',
        fetch: 'readonly',
        AbortSignal: 'readonly',
        document: 'readonly',
        localStorage: 'readonly',
        matchMedia: 'readonly',
        window: 'readonly',
        module: 'writable',
      },
    },
  },
);

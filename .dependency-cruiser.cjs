/**
 * Who may import whom, on resolved paths; DEVELOPERS.md shows the same as a table. A new feature needs no new line.
 * @type {import('dependency-cruiser').IConfiguration}
 */
module.exports = {
  forbidden: [
    {
      name: 'no-cycles',
      comment: 'Two modules that need each other are one module, or need a third below both.',
      severity: 'error',
      from: {},
      to: { circular: true },
    },
    {
      name: 'everything-resolves',
      severity: 'error',
      from: {},
      // Vite answers these itself: `?url` is a query of the bundler's.
      to: { couldNotResolve: true, pathNot: '\\?' },
    },
    {
      name: 'domain-is-pure',
      comment: 'The core knows no package, no platform and nothing of the wire.',
      severity: 'error',
      from: { path: '^src/domain/' },
      to: { pathNot: '^src/domain/' },
    },
    {
      name: 'contract-knows-domain-and-zod',
      severity: 'error',
      from: { path: '^src/contract/' },
      to: { pathNot: ['^src/(contract|domain)/', '(^|/)node_modules/zod/'] },
    },
    {
      name: 'client-knows-no-server',
      comment: 'Between client and server there is only the contract.',
      severity: 'error',
      from: { path: '^src/' },
      to: { path: '^(server|migrations|seeds|scripts|tests)/' },
    },
    {
      name: 'client-runs-in-a-browser',
      severity: 'error',
      from: { path: '^src/' },
      to: { dependencyTypes: ['core'] },
    },
    {
      name: 'building-blocks-know-no-feature',
      severity: 'error',
      from: { path: '^src/(components|lib)/' },
      to: { path: '^src/(features|app)/' },
    },
    {
      name: 'features-know-not-each-other',
      comment: 'What two features share belongs below both, in components, lib or the core.',
      severity: 'error',
      from: { path: '^src/features/([^/]+)/' },
      to: { path: ['^src/features/', '^src/app/'], pathNot: '^src/features/$1/' },
    },
    {
      name: 'nobody-imports-the-entry',
      severity: 'error',
      from: { pathNot: '^tests/' },
      to: { path: '^(src/main\\.tsx|server/main\\.ts)$' },
    },
    {
      name: 'server-knows-two-folders-of-src',
      severity: 'error',
      from: { path: '^server/' },
      to: { path: '^src/', pathNot: '^src/(domain|contract)/' },
    },
    {
      name: 'server-knows-no-tooling',
      severity: 'error',
      from: { path: '^server/' },
      to: { path: '^(migrations|seeds|scripts|tests)/' },
    },
    {
      name: 'server-features-ask-a-read-model',
      comment:
        "A neighbour's facts come from its read-model.ts; its store and use cases are its own. Drawing a label asks nobody.",
      severity: 'error',
      from: { path: '^server/features/([^/]+)/' },
      to: {
        path: '^server/features/',
        pathNot: [
          '^server/features/$1/',
          '^server/features/[^/]+/read-model(\\.ts$|/)',
          '^server/features/labels/draw/',
        ],
      },
    },
    {
      name: 'server-features-know-no-composition',
      severity: 'error',
      from: { path: '^server/(features|platform|http)/' },
      to: { path: '^server/[^/]+\\.ts$' },
    },
    {
      name: 'platform-knows-no-feature-and-no-http',
      severity: 'error',
      from: { path: '^server/platform/' },
      to: { path: '^server/(features|http)/' },
    },
    {
      name: 'http-knows-no-feature',
      severity: 'error',
      from: { path: '^server/http/' },
      to: { path: '^server/features/' },
    },
    {
      name: 'only-http-speaks-express',
      severity: 'error',
      from: { path: '^server/(features|platform)/' },
      to: {
        path: '(^|/)node_modules/(@types/)?(express|express-session|connect-pg-simple|multer|helmet|passport|passport-local)/',
      },
    },
    {
      name: 'only-platform-opens-connections',
      comment: 'A feature is handed its transaction: of knex it knows the types.',
      severity: 'error',
      from: { path: '^server/(features|http)/' },
      to: { path: '(^|/)node_modules/(@types/)?(knex|pg)/', dependencyTypesNot: ['type-only'] },
    },
    {
      name: 'migrations-stand-alone',
      comment: 'Frozen history: a migration that used our code would change with it.',
      severity: 'error',
      from: { path: '^migrations/\\d' },
      to: { pathNot: '(^|/)node_modules/knex/' },
    },
    {
      name: 'migrations-know-the-types-of-knex',
      severity: 'error',
      from: { path: '^migrations/' },
      to: { path: '(^|/)node_modules/', dependencyTypesNot: ['type-only'] },
    },
    {
      name: 'nobody-imports-the-outside',
      comment: 'Seeds, scripts and tests may use anything; nothing that ships uses them.',
      severity: 'error',
      from: { pathNot: '^(seeds|scripts|tests)/|^[^/]+$' },
      to: { path: '^(seeds|scripts|tests)/' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    // Imports of types count: they couple as well.
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
      extensions: ['.ts', '.tsx', '.mjs', '.js'],
    },
  },
};

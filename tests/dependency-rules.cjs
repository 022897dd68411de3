/** Import directions of the tree; see DEVELOPERS.md. */
module.exports = {
  forbidden: [
    { name: 'no-cycles', severity: 'error', from: {}, to: { circular: true } },
    {
      name: 'client-not-server',
      severity: 'error',
      from: { path: '^client/' },
      to: { path: '^server/' },
    },
    {
      name: 'server-not-client',
      severity: 'error',
      from: { path: '^server/' },
      to: { path: '^client/' },
    },
    {
      name: 'common-stands-alone',
      severity: 'error',
      from: { path: '^common/', pathNot: '\\.test\\.ts$' },
      to: { path: '^(client|server|tests|drizzle)/' },
    },
    {
      name: 'nothing-imports-tests',
      severity: 'error',
      from: { path: '^(client|server|common)/', pathNot: '\\.test\\.tsx?$' },
      to: { path: '^tests/' },
    },
    {
      name: 'features-keep-apart',
      severity: 'error',
      from: { path: '^client/src/features/([^/]+)/' },
      to: { path: '^client/src/features/', pathNot: '^client/src/features/$1/' },
    },
    {
      name: 'plain-ui-knows-no-feature',
      severity: 'error',
      from: { path: '^client/src/(lib|components|scene)/' },
      to: { path: '^client/src/(features|routes|app)/' },
    },
    {
      name: 'features-know-no-route',
      severity: 'error',
      from: { path: '^client/src/features/' },
      to: { path: '^client/src/(routes|app)/' },
    },
    {
      name: 'controllers-see-no-storage',
      severity: 'error',
      from: { path: '\\.controller\\.ts$' },
      to: { path: '(\\.repository|\\.table)\\.ts$' },
    },
    {
      name: 'engine-by-its-door',
      severity: 'error',
      from: { path: '^server/src/', pathNot: '^server/src/electrostatics/engine/' },
      to: {
        path: '^server/src/electrostatics/engine/',
        pathNot: '^server/src/electrostatics/engine/index\\.ts$',
      },
    },
    {
      name: 'dynamics-by-its-door',
      severity: 'error',
      from: { path: '^server/src/', pathNot: '^server/src/energetics/engine/' },
      to: {
        path: '^server/src/energetics/engine/',
        pathNot: '^server/src/energetics/engine/index\\.ts$',
      },
    },
  ],
  options: {
    tsPreCompilationDeps: true,
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(^|/)(node_modules|dist)/' },
    enhancedResolveOptions: {
      conditionNames: ['holdfast', 'import', 'require', 'node', 'default'],
    },
  },
};

// The import directions of the house, as errors: shared <- worker <- server, shared <- src.
module.exports = {
  forbidden: [
    { name: 'no-cycles', severity: 'error', from: {}, to: { circular: true } },
    {
      name: 'shared-stands-alone',
      comment: 'shared/ holds what both sides agree on: no I/O, no React, no Node.',
      severity: 'error',
      from: { path: '^shared/', pathNot: '\\.test\\.ts$' },
      to: { path: '^(worker|server|src|tests)/' },
    },
    {
      name: 'shared-no-node',
      severity: 'error',
      from: { path: '^shared/', pathNot: '\\.test\\.ts$' },
      to: { dependencyTypes: ['core'] },
    },
    {
      name: 'worker-below-server',
      severity: 'error',
      from: { path: '^worker/' },
      to: { path: '^(server|src)/' },
    },
    {
      name: 'optics-imports-itself-and-shared',
      severity: 'error',
      from: { path: '^worker/optics/', pathNot: '\\.test\\.ts$' },
      to: { pathNot: '^(worker/optics|shared)/' },
    },
    {
      name: 'server-not-client',
      severity: 'error',
      from: { path: '^server/' },
      to: { path: '^src/' },
    },
    {
      name: 'client-not-server',
      severity: 'error',
      from: { path: '^src/' },
      to: { path: '^(server|worker)/' },
    },
    {
      name: 'features-apart',
      comment: 'A route composes features; a feature never imports another.',
      severity: 'error',
      from: { path: '^src/features/([^/]+)/' },
      to: { path: '^src/features/', pathNot: '^src/features/$1/' },
    },
    {
      name: 'kit-below-features',
      severity: 'error',
      from: { path: '^src/(components|lib)/' },
      to: { path: '^src/(features|routes)/' },
    },
    {
      name: 'features-below-routes',
      severity: 'error',
      from: { path: '^src/features/' },
      to: { path: '^src/routes/' },
    },
    { name: 'not-to-unresolvable', severity: 'error', from: {}, to: { couldNotResolve: true } },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(^|/)dist/' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
    },
  },
};

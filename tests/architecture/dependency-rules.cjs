/** Who may import whom. `src -> shared <- server`, nothing else across. */
const forbid = (name, comment, from, to) => ({ name, comment, severity: 'error', from, to });

module.exports = {
  forbidden: [
    forbid(
      'no-cycles',
      'A cycle is two files that should be one, or three.',
      {},
      { circular: true },
    ),
    forbid(
      'shared-stands-alone',
      'shared runs in browser, server and tests alike',
      { path: '^shared/' },
      { path: '^(src|server|fixtures|tests)/' },
    ),
    forbid(
      'shared-packages',
      'zod for contracts, an FFT, and readers for CSV; nothing else',
      { path: '^shared/' },
      {
        dependencyTypes: ['npm', 'npm-dev', 'core'],
        pathNot: 'node_modules/(zod|fft\\.js|papaparse|udsv|@types)/',
      },
    ),
    forbid(
      'zod-in-contracts-only',
      'signal and fit functions take and give plain data',
      { path: '^shared/(signal|fits|quantities)/' },
      { path: 'node_modules/zod/' },
    ),
    forbid(
      'client-not-server',
      'They meet in shared',
      { path: '^src/' },
      { path: '^(server|fixtures|tests)/' },
    ),
    forbid('server-not-client', 'They meet in shared', { path: '^server/' }, { path: '^src/' }),
    forbid(
      'fixtures-for-tools-only',
      'Production never imports fixtures; the tools under server/cli load the demo and evaluate',
      { path: '^(server|src)/', pathNot: '^server/cli/' },
      { path: '^fixtures/' },
    ),
    forbid(
      'tools-are-leaves',
      'The product never imports its tools, which may import fixtures',
      { path: '^server/', pathNot: '^server/cli/' },
      { path: '^server/cli/' },
    ),
    forbid(
      'composition-is-the-top',
      'Only the process, the tools and the tests see every feature at once',
      { path: '^server/', pathNot: '^server/(main\\.ts$|compose(-notices)?\\.ts$|cli/)' },
      { path: '^server/(main|compose|compose-notices)\\.ts$' },
    ),
    forbid(
      'production-needs-no-dev-packages',
      'What runs in production is a dependency; types alone may come from devDependencies',
      { path: '^(server|src|shared)/', pathNot: '^server/cli/' },
      { dependencyTypes: ['npm-dev'], dependencyTypesNot: ['type-only'], pathNot: '/@types/' },
    ),
    forbid(
      'every-import-leads-somewhere',
      'An import that cannot be resolved is an unlisted package or a wrong path',
      { path: '^(server|src|shared|fixtures|tests)/' },
      { couldNotResolve: true },
    ),
    forbid(
      'nobody-imports-tests',
      'Tests are leaves',
      { path: '^(server|src|shared|fixtures)/' },
      { path: '^tests/' },
    ),
    forbid(
      'fixtures-import-shared-only',
      'Fixtures are data and generators',
      { path: '^fixtures/' },
      { path: '^(server|src|tests)/' },
    ),
    forbid(
      'features-apart-in-client',
      'src/app combines features',
      { path: '^src/features/([^/]+)/' },
      { path: '^src/features/', pathNot: '^src/features/$1/' },
    ),
    forbid(
      'features-not-app',
      'app is above features',
      { path: '^src/(features|charts|components|lib)/' },
      { path: '^src/app/' },
    ),
    forbid(
      'components-know-no-features',
      'Widgets and charts know no feature and no API',
      { path: '^src/(components|charts)/' },
      { path: '^src/(features|lib/api-client)' },
    ),
    forbid(
      'lib-is-lowest',
      'lib serves features and knows none',
      { path: '^src/lib/' },
      { path: '^src/(features|charts|components)/' },
    ),
    forbid(
      'features-apart-in-server',
      'The server hands one feature a narrow interface of another in compose.ts',
      { path: '^server/features/([^/]+)/' },
      { path: '^server/features/', pathNot: '^server/features/$1/' },
    ),
    forbid(
      'typeorm-at-home',
      'TypeORM appears in server/db and in repositories alone; compose.ts names the type it hands on',
      { path: '^server/', pathNot: '^server/(db/|compose\\.ts$|.*\\.repository\\.ts$)' },
      { path: 'node_modules/typeorm/' },
    ),
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(^|/)(dist|\\.data)/' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'types', 'default'],
      extensions: ['.ts', '.tsx', '.mjs', '.js', '.json'],
    },
  },
};

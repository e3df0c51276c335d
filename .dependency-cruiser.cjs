/** Dependencies point one way: app -> components -> shared; server -> shared; the engine stands on its types alone. */
module.exports = {
  forbidden: [
    {
      name: 'engine-is-pure',
      comment: 'The engine replays signed cases years later: no I/O, clock, randomness or UI, so it imports only its own files, types, mathjs, and the words and number formats of its sentences.',
      severity: 'error',
      from: { path: '^shared/engine/' },
      to: { pathNot: ['^shared/(engine|types|format)/', '^shared/text/engine/', '^node_modules/mathjs/'] },
    },
    {
      name: 'words-and-formats-are-pure',
      comment: 'They speak for the engine too, so what holds for it holds for them.',
      severity: 'error',
      from: { path: '^shared/(text|format)/' },
      to: { pathNot: '^shared/(text|format|types|engine|limits\\.ts)' },
    },
    {
      name: 'types-stand-alone',
      severity: 'error',
      from: { path: '^shared/types/' },
      to: { pathNot: '^shared/types/' },
    },
    {
      name: 'shared-knows-no-side',
      comment: 'What both sides use may depend on neither.',
      severity: 'error',
      from: { path: '^shared/' },
      to: { path: '^(app|components|server|scripts|tests)/' },
    },
    {
      name: 'client-not-to-server',
      severity: 'error',
      from: { path: '^(app|components)/' },
      to: { path: '^(server|scripts|tests)/' },
    },
    {
      name: 'components-not-to-routes',
      severity: 'error',
      from: { path: '^components/' },
      to: { path: '^app/' },
    },
    {
      name: 'server-not-to-client',
      severity: 'error',
      from: { path: '^server/' },
      to: { path: '^(app|components|scripts|tests)/' },
    },
    { name: 'no-cycles', severity: 'error', from: {}, to: { circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } } },
    { name: 'no-unresolved', severity: 'error', from: { pathNot: '^tests/fixtures/' }, to: { couldNotResolve: true } },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '^(dist|build|coverage|\\.expo|\\.data)/' },
    tsConfig: { fileName: 'tsconfig.json' },
    tsPreCompilationDeps: true,
    enhancedResolveOptions: {
      extensions: ['.web.tsx', '.web.ts', '.tsx', '.ts', '.mjs', '.cjs', '.js', '.json'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
      exportsFields: ['exports'],
    },
  },
};

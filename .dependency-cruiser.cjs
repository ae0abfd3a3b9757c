/** Directions of import between rooms, and no cycles. */
module.exports = {
  forbidden: [
    { name: 'no-cycle', severity: 'error', from: {}, to: { circular: true } },
    {
      name: 'shared-is-alone',
      severity: 'error',
      from: { path: '^shared/' },
      to: { path: '^(server|src)/' },
    },
    { name: 'server-not-src', severity: 'error', from: { path: '^server/' }, to: { path: '^src/' } },
    { name: 'src-not-server', severity: 'error', from: { path: '^src/' }, to: { path: '^server/' } },
    {
      name: 'features-apart',
      comment: 'A feature never imports another; what two need moves to components, lib or drawings.',
      severity: 'error',
      from: { path: '^(src|server)/features/([^/]+)/' },
      to: { path: '^$1/features/', pathNot: '^$1/features/$2/' },
    },
    {
      name: 'parts-below-features',
      severity: 'error',
      from: { path: '^src/(components|lib|drawings)/' },
      to: { path: '^src/(features|routes|app)/' },
    },
    {
      name: 'features-below-routes',
      severity: 'error',
      from: { path: '^src/features/' },
      to: { path: '^src/(routes|app)/' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsPreCompilationDeps: true,
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
    },
  },
};

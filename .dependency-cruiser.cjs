/**
 * Imports run one way: app → components → shared and server → db → shared.
 * Each rule says why it stands.
 */
module.exports = {
  forbidden: [
    { name: 'no-circular', comment: 'A cycle hides which file is the foundation of which.', severity: 'error', from: {}, to: { circular: true } },
    { name: 'stats-stands-alone', comment: 'The numbers must be readable and testable without the product.', severity: 'error', from: { path: '^shared/stats/' }, to: { path: '^(app|components|server|db|scripts|shared/(?!stats/))' } },
    { name: 'shared-runs-anywhere', comment: 'The same rules run in the browser and on the server.', severity: 'error', from: { path: '^shared/' }, to: { path: '^(app|components|server|db|scripts|data)/|^node_modules/(react|react-native|express|drizzle-orm|pg)/', dependencyTypesNot: ['type-only'] } },
    { name: 'shared-without-node', comment: 'A Node module in shared breaks the client.', severity: 'error', from: { path: '^shared/' }, to: { dependencyTypes: ['core'] } },
    { name: 'client-not-server', comment: 'The client speaks HTTP; server code must not reach a browser.', severity: 'error', from: { path: '^(app|components)/' }, to: { path: '^(server|db|scripts)/' } },
    { name: 'app-only-components', comment: 'A route reads params and renders a screen; everything else lives in components.', severity: 'error', from: { path: '^app/' }, to: { path: '^(components/(api|queries)|shared/stats)/' } },
    { name: 'only-queries-call-api', comment: 'One place knows keys, caching and addresses.', severity: 'error', from: { path: '^components/(?!queries/|api/)' }, to: { path: '^components/api/', dependencyTypesNot: ['type-only'] } },
    { name: 'ui-knows-no-domain', comment: 'The kit of controls serves every screen.', severity: 'error', from: { path: '^components/(ui|theme)/' }, to: { path: '^components/(species|scaling|bench|review|submissions|versions|curate|account|charts|queries)/|^shared/(contracts|stats)/' } },
    { name: 'db-not-server', comment: 'Queries serve services, not the other way round.', severity: 'error', from: { path: '^db/' }, to: { path: '^(server|app|components|scripts)/' } },
    { name: 'server-not-client', comment: 'The server has no part in how a screen looks.', severity: 'error', from: { path: '^server/' }, to: { path: '^(app|components)/' } },
    { name: 'only-db-speaks-sql', comment: 'Only db/queries writes SQL, so that a rule about rows has one address.', severity: 'error', from: { path: '^server/(?!auth|context|jobs/queue|fakes)' }, to: { path: '^node_modules/(drizzle-orm|pg)/', dependencyTypesNot: ['type-only'] } },
    { name: 'shipped-code-uses-shipped-packages', comment: 'A development package is absent in production.', severity: 'error', from: { path: '^(app|components|server|db|shared)/' }, to: { dependencyTypes: ['npm-dev'], dependencyTypesNot: ['type-only'], pathNot: '@types/' } },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: { extensions: ['.ts', '.tsx', '.web.ts', '.web.tsx', '.js', '.mjs', '.json'], exportsFields: ['exports'], conditionNames: ['import', 'require', 'node', 'default', 'types'] },
  },
};

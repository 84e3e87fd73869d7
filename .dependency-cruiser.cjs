// The law of directions: app → components → lib/client → lib/contracts → core,
// and on the server app/api → lib/use-cases → db, lib/services → lib/contracts → core. Nothing points back.
const CORE = '^lib/(genetics|kinship|shares|money|terms|ledger|season|facility)/';

module.exports = {
  forbidden: [
    { name: 'no-circular', severity: 'error', from: {}, to: { circular: true } },
    {
      name: 'core-is-pure',
      comment: 'The core knows no framework, database, validation library, clock or randomness.',
      severity: 'error',
      from: { path: CORE },
      to: { pathNot: [CORE, '^node_modules/fraction\\.js/'] },
    },
    {
      name: 'contracts-use-core-only',
      severity: 'error',
      from: { path: '^lib/contracts/' },
      to: { pathNot: ['^lib/contracts/', CORE, '^node_modules/zod/'] },
    },
    {
      name: 'client-uses-contracts-only',
      severity: 'error',
      from: { path: '^lib/client/' },
      to: { path: '^(app|components|db|seeds|scripts|lib/(use-cases|services|api))/' },
    },
    {
      name: 'components-stay-in-the-browser',
      severity: 'error',
      from: { path: '^components/' },
      to: { path: '^(app|db|seeds|scripts|tests|lib/(use-cases|services|api))/' },
    },
    {
      name: 'components-reach-no-server-module',
      comment: 'Also not through a chain of imports.',
      severity: 'error',
      from: { path: '^components/' },
      to: { path: '^(db|lib/(use-cases|services|api))/', reachable: true },
    },
    {
      name: 'ui-knows-no-animals',
      severity: 'error',
      from: { path: '^components/ui/' },
      to: { path: '^(components/(?!ui/)|lib/)' },
    },
    {
      name: 'drawings-use-core-and-ui-only',
      severity: 'error',
      from: { path: '^components/drawings/' },
      to: { path: '^(components/(?!(ui|drawings)/)|lib/client/)' },
    },
    {
      name: 'db-points-down',
      severity: 'error',
      from: { path: '^db/' },
      to: { path: '^(app|components|lib/(use-cases|services|api|client))/' },
    },
    {
      name: 'services-point-down',
      severity: 'error',
      from: { path: '^lib/services/' },
      to: { path: '^(app|components|lib/(use-cases|api|client))/' },
    },
    {
      name: 'use-cases-point-down',
      severity: 'error',
      from: { path: '^lib/use-cases/' },
      to: { path: '^(app|components|lib/(api|client))/' },
    },
    {
      name: 'pages-reach-the-database-through-use-cases',
      severity: 'error',
      from: { path: '^app/' },
      to: { path: '^db/' },
    },
    {
      name: 'product-needs-no-tests-or-seeds',
      severity: 'error',
      from: { path: '^(app|components|lib|db)/' },
      to: { path: '^(tests|seeds|scripts)/' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
    },
  },
};

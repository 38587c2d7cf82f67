/*
 * The arrows of the house: who may know whom, type imports counted. Each rule prints its reason when it fails.
 * Run by: npx depcruise --config tests/architecture/dependency-cruiser.cjs app server lib db
 */

/** A package by name, whether it was found in node_modules or not. */
const packages = (names) => `(^|node_modules/)(${names})(/|$)`;

/** From the ground up: a layer may know the ones before it, never one after it. */
const layers = ['units', 'signal', 'response', 'conduction', 'change', 'alert', 'case'];

const layerRules = layers.slice(0, -1).map((layer, index) => ({
  name: `lib-${layer}-knows-no-higher-layer`,
  comment: `lib/${layer} stands below ${layers.slice(index + 1).join(', ')}: a layer that knows a higher one cannot be tested or understood without it.`,
  severity: 'error',
  from: { path: `^lib/${layer}/` },
  to: { path: `^lib/(${layers.slice(index + 1).join('|')})/` },
}));

const libRules = [
  {
    name: 'lib-is-below-everything',
    comment: 'lib is the same code in browser, server and tests: it knows neither pages, nor the server, nor the database.',
    severity: 'error',
    from: { path: '^lib/' },
    to: { path: '^(app|server|db|public|tests)/' },
  },
  {
    name: 'lib-does-no-input-or-output',
    comment: 'lib has no I/O, no clock and no dice: a function there is known by its arguments alone, so Node modules stay outside.',
    severity: 'error',
    from: { path: '^lib/' },
    to: { dependencyTypes: ['core'] },
  },
  {
    name: 'lib-uses-three-packages',
    comment: 'lib uses zod at the door, and canonical JSON and hashes for the record; everything else would tie it to one side.',
    severity: 'error',
    from: { path: '^lib/' },
    to: { dependencyTypesNot: ['core'], pathNot: [packages('zod|canonicalize|@noble/hashes'), '^(@/|app/|server/|lib/|db/|public/|tests/)'] },
  },
  {
    name: 'lib-science-knows-no-wire',
    comment: 'Science, case and policy know no wire: messages change with their readers, the rules of judging must not.',
    severity: 'error',
    from: { path: '^lib/(units|signal|response|conduction|change|alert|case|record|reference|outcome|policy)/' },
    to: { path: '^lib/contracts/' },
  },
  {
    name: 'lib-science-has-no-words-for-people',
    comment: 'Sentences for people live in lib/text, so that a wording can change without touching what is judged.',
    severity: 'error',
    from: { path: '^lib/(units|signal|response|conduction|change|alert|case|record|reference|outcome|policy|contracts)/' },
    to: { path: '^lib/(text|chart)/' },
  },
  {
    name: 'lib-reference-rows-are-ground',
    comment: 'Reference rows stand below science. Only the templates, which are whole plans, know the words of a plan.',
    severity: 'error',
    from: { path: '^lib/reference/', pathNot: '^lib/reference/templates/' },
    to: { path: '^lib/(?!reference/|units/)' },
  },
  {
    name: 'lib-science-knows-no-templates',
    comment: 'A case carries its own copy of its template; judging that looks at the template would change old cases.',
    severity: 'error',
    from: { path: '^lib/', pathNot: '^lib/reference/' },
    to: { path: '^lib/reference/templates/' },
  },
  {
    name: 'lib-record-knows-no-case',
    comment: 'The chain seals bytes whatever they say: a verifier must not need the rules of judging.',
    severity: 'error',
    from: { path: '^lib/record/' },
    to: { path: '^lib/(?!record/)' },
  },
  {
    name: 'lib-has-no-orphans',
    comment: 'A file that nothing uses and that uses nothing is forgotten or not yet honest.',
    severity: 'error',
    from: { path: '^lib/', orphan: true },
    to: {},
  },
];

const packageRules = [
  {
    name: 'zod-only-at-the-doors',
    comment: 'What comes in is parsed at the door (lib/contracts, server/settings); inside, types are trusted.',
    severity: 'error',
    from: { pathNot: '^(lib/contracts|server/settings)/' },
    to: { path: packages('zod') },
  },
  {
    name: 'socket-io-only-in-server-live',
    comment: 'One place knows the sockets of the server: server/live.',
    severity: 'error',
    from: { pathNot: '^server/live/' },
    to: { path: packages('socket\\.io|engine\\.io') },
  },
  {
    name: 'socket-io-client-only-in-app-live',
    comment: 'One place knows the socket of the browser: app/_live, where sequence and waiting entries are kept.',
    severity: 'error',
    from: { pathNot: '^app/_live/' },
    to: { path: packages('socket\\.io-client') },
  },
  {
    name: 'sql-only-in-db',
    comment: 'SQL lives in db; the set-up creates the cluster, and the composition root opens and closes the pool.',
    severity: 'error',
    from: { pathNot: '^(db/|server/setup/|knexfile\\.ts$|server/main\\.ts$)' },
    to: { path: packages('knex|pg|@types/pg') },
  },
  {
    name: 'react-only-in-app',
    comment: 'Only pages and their parts draw.',
    severity: 'error',
    from: { pathNot: '^app/' },
    to: { path: packages('react|react-dom|@types/react|@types/react-dom|zustand|radix-ui|recharts|react-hook-form|@tanstack/react-query') },
  },
  {
    name: 'no-server-only-package',
    comment: 'It throws under plain Node, and the custom server loads the same files.',
    severity: 'error',
    from: {},
    to: { path: packages('server-only|client-only') },
  },
  {
    name: 'no-development-package-in-the-product',
    comment: 'The product runs without the packages of its tests.',
    severity: 'error',
    from: { path: '^(app|server|lib|db)/' },
    to: { dependencyTypes: ['npm-dev'] },
  },
  {
    name: 'no-undeclared-package',
    comment: 'A package that is used is named and pinned in package.json.',
    severity: 'error',
    from: { path: '^(app|server|lib|db)/' },
    to: { dependencyTypes: ['npm-no-pkg', 'npm-unknown'] },
  },
];

const edgeRules = [
  {
    name: 'db-knows-lib-only',
    comment: 'The database layer answers questions; it does not know who asks.',
    severity: 'error',
    from: { path: '^db/' },
    to: { path: '^(app|server|tests)/' },
  },
  {
    name: 'server-knows-no-page',
    comment: 'Pages stand on the server, not the other way round. Only the composition root starts Next.',
    severity: 'error',
    from: { path: '^server/', pathNot: '^server/main\\.ts$' },
    to: { path: '^app/' },
  },
  {
    name: 'commands-and-queries-know-no-edge',
    comment: 'Commands and queries are the same for a page, a route, a socket and a timer.',
    severity: 'error',
    from: { path: '^server/(commands|queries)/' },
    to: { path: '^server/(live|http|setup|workers)/' },
  },
  {
    name: 'only-commands-and-timers-write',
    comment: 'A query reads: it knows no command.',
    severity: 'error',
    from: { path: '^server/queries/' },
    to: { path: '^server/commands/' },
  },
  {
    name: 'app-knows-no-database',
    comment: 'Pages compose and routes pass on; whoever needs a row asks a query or a command.',
    severity: 'error',
    from: { path: '^app/' },
    to: { path: '^db/' },
  },
  {
    name: 'browser-code-knows-lib-only',
    comment: 'What runs in the browser imports lib only; one server import would carry the server into the bundle.',
    severity: 'error',
    from: { path: '^app/_(features|ui|live)/' },
    to: { path: '^(server|db)/' },
  },
  {
    name: 'browser-code-has-no-node-modules',
    comment: 'What runs in the browser has no Node modules.',
    severity: 'error',
    from: { path: '^app/_(features|ui|live)/' },
    to: { dependencyTypes: ['core'] },
  },
  {
    name: 'features-do-not-know-each-other',
    comment: 'A feature can be changed or removed alone. What two of them share belongs to _ui, _live or lib.',
    severity: 'error',
    from: { path: '^app/_features/([^/]+)/' },
    to: { path: '^app/_features/', pathNot: '^app/_features/$1/' },
  },
  {
    name: 'shared-parts-know-no-feature',
    comment: 'Primitives and the live store serve every feature, so they know none.',
    severity: 'error',
    from: { path: '^app/_(ui|live)/' },
    to: { path: '^app/_features/' },
  },
  {
    name: 'primitives-have-no-domain-words',
    comment: 'A button does not know what a nerve is: app/_ui knows no part of lib but the charts it draws.',
    severity: 'error',
    from: { path: '^app/_ui/' },
    to: { path: '^lib/(?!chart/)' },
  },
  {
    name: 'product-knows-no-test',
    comment: 'The product stands without its tests.',
    severity: 'error',
    from: { path: '^(app|server|lib|db)/' },
    to: { path: '^tests/' },
  },
  {
    name: 'no-circle',
    comment: 'Two files that need each other are one file, or a third is missing.',
    severity: 'error',
    from: {},
    to: { circular: true },
  },
  {
    name: 'no-unknown-file',
    comment: 'Every import leads to a file or a package that is there.',
    severity: 'error',
    from: {},
    to: { couldNotResolve: true },
  },
];

/** @type {import('dependency-cruiser').IConfiguration} */
module.exports = {
  forbidden: [...layerRules, ...libRules, ...packageRules, ...edgeRules],
  options: {
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(^|/)\\.next/' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
      extensions: ['.ts', '.tsx', '.mjs', '.js', '.json', '.css'],
    },
  },
};

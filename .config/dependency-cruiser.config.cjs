/**
 * Who may import whom. A room of src may import what stands beside it here, itself,
 * and src/refusal.ts; `types` may be imported for their types only.
 * Files that lie directly in src (main, config, ask …) put the rooms together and may import all.
 */
const rooms = {
  calc: {},
  words: { values: ['calc'] },
  drawing: { values: ['calc'] },
  // What a picture is drawn from, and the words it needs, are said by the drawing.
  card: { types: ['calc', 'drawing'] },
  // Quantities are converted at the two edges, words and phrases, by the one set of conversions.
  phrases: { values: ['card', 'calc/units'], types: ['calc', 'drawing'] },
  store: {},
  shop: { values: ['store', 'calc'], types: ['card'] },
  desk: { values: ['card', 'words', 'phrases', 'shop'] },
  adapters: { values: ['desk', 'card', 'phrases', 'drawing'] },
  config: { everything: true },
  demo: { everything: true },
};
const commandsMayImport = ['desk', 'calc', 'words', 'shop', 'card'];

const ours = '^(src|commands|test)/';
const anyRoom = Object.keys(rooms).join('|');
const engines = ['kysely', 'better-sqlite3', 'pg'];

/** A room by its name is a folder or a file of that name. */
const place = (name) => `^src/${name}(/|\\.ts$)`;
const refusal = place('refusal');

const layer = (name, from, own, { values = [], types = [] }) => [
  {
    name: `${name}-imports`,
    comment: `${name} may import only: ${[...values, ...types.map((t) => `${t} (types)`), 'refusal'].join(', ')}`,
    severity: 'error',
    from: { path: from },
    to: { path: ours, pathNot: [own, refusal, ...[...values, ...types].map(place)] },
  },
  ...(types.length === 0
    ? []
    : [
        {
          name: `${name}-types-only`,
          comment: `${name} may import ${types.join(', ')} for types only: write "import type"`,
          severity: 'error',
          from: { path: from },
          to: {
            path: types.map(place),
            pathNot: [own, ...values.map(place)],
            dependencyTypesNot: ['type-only'],
          },
        },
      ]),
];

const layers = Object.entries(rooms)
  .filter(([name, room]) => name !== 'adapters' && !room.everything)
  .flatMap(([name, room]) => layer(name, place(name), place(name), room));

/** @type {import('dependency-cruiser').IConfiguration} */
module.exports = {
  forbidden: [
    ...layers,
    ...layer('commands', '^commands/', '^commands/', { values: commandsMayImport }),
    ...layer(
      'adapters',
      '^src/adapters/([^/.]+)',
      '^src/adapters/($1|common)(/|\\.ts$)',
      rooms.adapters,
    ),
    {
      name: 'refusal-imports',
      comment: 'refusal is one file of types and imports nothing',
      severity: 'error',
      from: { path: refusal },
      to: {},
    },
    {
      name: 'calc-is-pure',
      comment: 'calc has no clock, no I/O and no package: it imports calc only',
      severity: 'error',
      from: { path: place('calc') },
      to: { pathNot: [place('calc'), refusal] },
    },
    {
      name: 'engines-in-store',
      comment: 'only src/store knows the database packages',
      severity: 'error',
      from: { path: '^(src|commands)/', pathNot: [place('store')] },
      to: {
        path: [`(^|/)node_modules/(@types/)?(${engines.join('|')})/`, `^(${engines.join('|')})$`],
      },
    },
    {
      name: 'nothing-imports-main',
      comment: 'main puts everything together and is imported by nothing',
      severity: 'error',
      from: {},
      to: { path: place('main') },
    },
    {
      name: 'room-unknown-from',
      comment:
        'a new room of src needs a line in the table of .config/dependency-cruiser.config.cjs',
      severity: 'error',
      from: { path: `^src/(?!(${anyRoom})/)[^/]+/` },
      to: {},
    },
    {
      name: 'room-unknown-to',
      comment:
        'a new room of src needs a line in the table of .config/dependency-cruiser.config.cjs',
      severity: 'error',
      from: {},
      to: { path: `^src/(?!(${anyRoom})/)[^/]+/` },
    },
    {
      name: 'product-imports-test',
      comment: 'the product never imports its tests',
      severity: 'error',
      from: { path: '^(src|commands)/' },
      to: { path: '^test/' },
    },
    {
      name: 'no-circles',
      severity: 'error',
      from: {},
      to: { circular: true },
    },
    {
      name: 'unresolved',
      comment: 'the import leads nowhere',
      severity: 'error',
      from: {},
      to: { couldNotResolve: true },
    },
    {
      name: 'product-imports-dev-package',
      comment: 'what the product imports stands under dependencies',
      severity: 'error',
      from: { path: '^(src|commands)/' },
      to: { dependencyTypes: ['npm-dev'], dependencyTypesNot: ['type-only'] },
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

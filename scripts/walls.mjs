/**
 * Which room a file belongs to, and which rooms and packages it may open.
 * `wallConfig` turns the tables below into settings of eslint-plugin-boundaries; the architecture
 * test plants a violation of each line and sees it caught.
 */
import boundaries from 'eslint-plugin-boundaries';

const sharedRooms = ['units', 'math', 'waves', 'antenna', 'files', 'model', 'contracts'];
const serverRooms = ['server-root', 'server-http', 'server-database', 'server-engine', 'server-feature'];
const featureFolder = 'server/!(http|database|engine)';
const namedRoles = ['routes', 'service', 'repository', 'entity'];
const clientFeature = 'src/app/!(api|ui|session)';

/** A file may carry several categories: its room, and in the server its role. */
const categories = [
  ...sharedRooms.map((room) => ({ category: room, pattern: `shared/${room}/**` })),
  { category: 'client-root', pattern: ['src/*', 'src/app/*'] },
  { category: 'client-api', pattern: 'src/app/api/**' },
  { category: 'client-ui', pattern: 'src/app/ui/**' },
  { category: 'client-session', pattern: 'src/app/session/**' },
  { category: 'client-feature', pattern: `${clientFeature}/**`, capture: ['feature'] },
  { category: 'client-asset', pattern: ['src/assets/**', 'src/styles/**'] },
  { category: 'server-root', pattern: 'server/*' },
  { category: 'server-config', pattern: 'server/config.ts' },
  { category: 'server-http-entry', pattern: ['server/app.ts', 'server/main.ts'] },
  { category: 'server-http', pattern: 'server/http/**' },
  { category: 'server-database', pattern: 'server/database/**' },
  { category: 'server-engine', pattern: 'server/engine/**' },
  { category: 'server-feature', pattern: `${featureFolder}/**`, capture: ['feature'] },
  ...namedRoles.map((role) => ({ category: role, pattern: `${featureFolder}/**/*-${role}.ts` })),
  { category: 'spec', pattern: '**/*.spec.ts' },
];

/** room -> the other rooms it may open; its own room is always open. */
const openRooms = {
  units: [],
  math: ['units'],
  waves: ['math', 'units'],
  antenna: ['waves', 'math', 'units', 'model'],
  files: ['units', 'math', 'model'],
  model: ['units'],
  contracts: ['model', 'units'],
  'client-root': ['client-api', 'client-ui', 'client-session', 'client-feature', 'client-asset', ...sharedRooms],
  'client-api': ['contracts', 'model'],
  'client-ui': ['units', 'math', 'client-asset'],
  'client-session': ['client-api', 'client-ui', ...sharedRooms],
  'server-root': [...serverRooms, ...sharedRooms],
  'server-http': ['server-config', ...sharedRooms],
  'server-database': ['server-config', 'server-http', 'entity', ...sharedRooms],
  'server-engine': sharedRooms,
};

/** Inside a server feature: role -> the roles of the same feature it may open, and the rooms outside. */
const roles = {
  routes: { own: ['routes', 'service', 'plain'], rooms: ['server-http', 'server-config'], otherServices: true },
  service: {
    own: ['service', 'repository', 'plain'],
    rooms: ['server-http', 'server-database', 'server-engine', 'server-config'],
    otherServices: true,
  },
  repository: { own: ['repository', 'entity', 'plain'], rooms: ['server-database', 'server-http'], otherServices: false },
  entity: { own: ['entity', 'plain'], rooms: [], otherServices: false },
  plain: { own: ['plain'], rooms: ['server-http', 'server-config', 'server-engine'], otherServices: true },
};

const expressFamily = ['express', 'express-rate-limit', 'helmet', 'compression', 'cookie-parser', 'multer', 'pino-http'];

const inRoom = (...names) => ({ file: { categories: { anyOf: names } } });
const packages = (...names) => ({ module: { origin: 'external', source: names } });
const core = { module: { origin: 'core' } };
const anyPackage = { module: { origin: 'external' } };

/** A plain file of a server feature is one whose name ends in none of the roles. */
const roleCategories = (role) => (role === 'plain' ? { allOf: ['server-feature'], noneOf: namedRoles } : { allOf: [role] });
const inRole = (role) => ({ file: { categories: roleCategories(role) } });

const ofThisFeature = (fileCategories) => ({
  file: { categories: fileCategories, captured: { feature: '{{ from.file.captured.feature }}' } },
});

function roomPolicies() {
  const open = Object.entries(openRooms).map(([room, others]) => ({ from: inRoom(room), allow: { to: inRoom(room, ...others) } }));
  const clientFeatures = [
    { from: inRoom('client-feature'), allow: { to: inRoom('client-api', 'client-ui', 'client-session', 'client-asset', ...sharedRooms) } },
    { from: inRoom('client-feature'), allow: { to: ofThisFeature({ anyOf: ['client-feature'] }) } },
  ];
  const serverFeatures = Object.entries(roles).flatMap(([role, { own, rooms, otherServices }]) => [
    { from: inRole(role), allow: { to: inRoom(...rooms, ...sharedRooms) } },
    ...own.map((other) => ({ from: inRole(role), allow: { to: ofThisFeature(roleCategories(other)) } })),
    ...(otherServices ? [{ from: inRole(role), allow: { to: inRoom('service') } }] : []),
  ]);
  // A service may name the type of a row it passes on, and no more.
  const rowTypes = { from: inRole('service'), allow: { to: ofThisFeature({ allOf: ['entity'] }), dependency: { kind: 'type' } } };
  const featureSpec = { file: { categories: { allOf: ['server-feature', 'spec'] } } };
  const serverSpecs = { from: featureSpec, allow: { to: [ofThisFeature({ allOf: ['server-feature'] }), inRoom('server-database')] } };
  return [...open, ...clientFeatures, ...serverFeatures, rowTypes, serverSpecs];
}

function packagePolicies() {
  const client = inRoom('client-root', 'client-api', 'client-ui', 'client-session', 'client-feature');
  const lazily = [{ kind: 'type' }, { nodeKind: 'dynamic-import' }];
  return [
    { from: inRoom('model', 'contracts'), allow: { to: packages('zod') } },
    { from: client, allow: { to: packages('@angular/*', 'rxjs', 'tslib') } },
    // Parsing a reply takes the schema as an argument, so the clients name its type.
    { from: inRoom('client-api'), allow: { to: packages('zod'), dependency: { kind: 'type' } } },
    { from: client, allow: { to: packages('mathjs', 'jszip'), dependency: lazily } },
    { from: inRoom('client-ui'), allow: { to: packages('plotly.js-dist-min'), dependency: lazily } },
    { from: inRoom(...serverRooms), allow: { to: [anyPackage, core] } },
    { from: inRoom(...serverRooms), disallow: { to: packages('@angular/*', 'plotly.js-dist-min') } },
    { from: inRoom(...serverRooms), disallow: { to: packages('typeorm') } },
    { from: inRoom('repository', 'entity', 'server-database'), allow: { to: packages('typeorm') } },
    { from: inRoom(...serverRooms), disallow: { to: packages(...expressFamily) } },
    { from: inRoom('routes', 'server-http', 'server-http-entry'), allow: { to: packages(...expressFamily) } },
    // Specs keep the walls between rooms but may use test tools and files of fixtures.
    { from: inRoom('spec'), allow: { to: [anyPackage, core] } },
  ];
}

/** ESLint configuration of the walls for a source tree rooted at `rootPath`. */
export function wallConfig(rootPath) {
  return {
    files: ['shared/**/*.ts', 'server/**/*.ts', 'src/**/*.ts'],
    plugins: { boundaries },
    settings: {
      'import/resolver': { node: { extensions: ['.ts', '.d.ts', '.js', '.mjs', '.cjs'] } },
      'boundaries/root-path': rootPath,
      'boundaries/files': categories,
      'boundaries/legacy-templates': false,
      'boundaries/dependency-nodes': ['import', 'dynamic-import', 'export', 'require'],
      'boundaries/additional-dependency-nodes': [
        { selector: 'TSImportType > Literal', kind: 'type', name: 'import-type' },
        { selector: 'TSExternalModuleReference > Literal', kind: 'value', name: 'import' },
      ],
    },
    rules: {
      'boundaries/no-unknown-files': 'error',
      'boundaries/dependencies': [
        'error',
        {
          default: 'disallow',
          checkAllOrigins: true,
          checkUnknownLocals: true,
          checkInternals: true,
          message: 'This file ({{ from.file.categories }}) may not open "{{ dependency.source }}", or there is no such file: see the table of walls in scripts/walls.mjs.',
          policies: [...roomPolicies(), ...packagePolicies()],
        },
      ],
    },
  };
}

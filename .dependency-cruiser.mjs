import { fileURLToPath } from 'node:url';
import { openFiles } from './service/scripts/service-doors.mjs';

const TEST = '\\.(test|spec|e2e-spec)\\.tsx?$';
const TESTING = '^(shared|service|seed|ui)/src/testing/|^ui/src/features/[a-z-]+/testing/';
const SHARED = '^shared/(src|dist)/';
const DATE_FNS = '^node_modules/(date-fns|@date-fns/tz)/';
const FOUNDATION = '^service/src/(config|database|common)/';
/** Every folder of the service that is not part of the foundation is an area. */
const AN_AREA = '^service/src/(?!(config|database|common)/)[^/]+/';

/** Pure functions on what a door hands out; they hold no connection, so no module has to export them. */
const OPEN_FUNCTIONS = ['alerts/alert-record', 'alerts/turn-look'];
const DOORS = [...openFiles(fileURLToPath(new URL('service/src', import.meta.url))), ...OPEN_FUNCTIONS];

/** Areas of `shared` with those they may build on, from the top of the tree order down. */
const SHARED_AREAS = {
  timetable: [],
  plan: ['timetable'],
  turn: ['timetable', 'plan'],
  forecast: ['timetable', 'plan', 'turn'],
  lateness: ['timetable', 'plan', 'turn', 'forecast'],
  records: ['timetable', 'plan', 'turn', 'forecast'],
  history: ['timetable', 'plan', 'turn', 'forecast', 'lateness', 'records'],
  duty: ['timetable', 'plan', 'turn', 'forecast', 'lateness'],
  access: ['timetable', 'plan', 'turn'],
};

/** The service day is where a wall clock becomes an instant: the one area that needs the date library itself. */
const NEEDS_DATES = ['timetable'];

const areaRule = ([area, above]) => ({
  name: `shared-${area}`,
  comment: `${['lib', ...above].join(', ')} may stand under ${area}, nothing else: a rule can be read without what is built on it.`,
  severity: 'error',
  from: { path: `^shared/src/${area}/`, pathNot: TEST },
  to: {
    pathNot: [
      `^shared/src/(${['lib', area, ...above].join('|')})/`,
      ...(NEEDS_DATES.includes(area) ? [DATE_FNS] : []),
    ],
  },
});

const SHARED_RULES = [
  {
    name: 'shared-lib',
    comment:
      'lib knows nothing of trains: it may use itself and the date library only, so that every area can stand on it.',
    severity: 'error',
    from: { path: '^shared/src/lib/', pathNot: TEST },
    to: { pathNot: `^shared/src/lib/|${DATE_FNS}` },
  },
  ...Object.entries(SHARED_AREAS).map(areaRule),
  {
    name: 'shared-contract',
    comment:
      'The wire contract is zod over the types of the areas; a framework in it would reach both sides.',
    severity: 'error',
    from: { path: '^shared/src/contract/', pathNot: TEST },
    to: { pathNot: '^shared/src/(?!testing/)|^node_modules/zod/' },
  },
  {
    name: 'contract-is-outermost',
    comment:
      'The domain never takes wire types: what the wire looks like may change without touching a rule.',
    severity: 'error',
    from: {
      path: '^shared/src/',
      pathNot: `^shared/src/(contract|testing)/|^shared/src/index\\.ts$|${TEST}`,
    },
    to: { path: '^shared/src/contract/' },
  },
  {
    name: 'shared-knows-nobody',
    comment:
      'shared decides for all; if it knew the service, the seed or the screens, none of them could be changed alone.',
    severity: 'error',
    from: { path: '^shared/' },
    to: { path: '^(service|seed|ui)/' },
  },
];

const SERVICE_RULES = [
  {
    name: 'service-knows-neither-ui-nor-seed',
    comment:
      'The service answers whoever asks; the screens and the demo stories stand on it, not the other way round.',
    severity: 'error',
    from: { path: '^service/' },
    to: { path: '^(ui|seed)/' },
  },
  {
    name: 'foundation-knows-no-area',
    comment:
      'config, database and common carry every area; one that knew an area could not carry the others.',
    severity: 'error',
    from: { path: FOUNDATION, pathNot: TEST },
    to: { path: AN_AREA },
  },
  {
    name: 'areas-meet-at-the-door',
    comment:
      'Another area is used through what its module exports, so that the rest of it can change without asking.',
    severity: 'error',
    from: { path: '^service/src/([^/]+)/', pathNot: `\\.entity\\.ts$|${TEST}` },
    to: {
      path: AN_AREA,
      pathNot: ['^service/src/$1/', '\\.module\\.ts$', `^service/src/(${DOORS.join('|')})\\.ts$`],
      // A type that a door's methods take or give may be named.
      dependencyTypesNot: ['type-only'],
    },
  },
  {
    name: 'entities-point-at-entities',
    comment: 'A foreign key names the row of another area and nothing more of that area.',
    severity: 'error',
    from: { path: '^service/src/([^/]+)/.*\\.entity\\.ts$' },
    to: { path: AN_AREA, pathNot: '^service/src/$1/|\\.entity\\.ts$' },
  },
];

const UI_RULES = [
  {
    name: 'ui-takes-shared-only',
    comment: 'The screens know the rules and the wire, never the code of the server.',
    severity: 'error',
    from: { path: '^ui/src/' },
    to: { path: '^(service|seed)/' },
  },
  {
    name: 'ui-base-knows-no-feature',
    comment:
      'lib, components and config serve all features; one that knew a feature would drag it into every page.',
    severity: 'error',
    from: { path: '^ui/src/(lib|components|config)/' },
    to: { path: '^ui/src/(features|app)/' },
  },
  {
    name: 'features-stay-apart',
    comment:
      'Features are put together by the pages in app; a feature that imports another cannot be taken out or changed alone.',
    severity: 'error',
    from: { path: '^ui/src/features/([^/]+)/' },
    to: { path: '^ui/src/(features|app)/', pathNot: '^ui/src/features/$1/' },
  },
  {
    name: 'timeline-library-on-the-board-only',
    comment:
      'The timeline library is large and draws what only the board needs; every other page must load without it.',
    severity: 'error',
    from: { path: '^ui/src/', pathNot: '^ui/src/features/board/' },
    to: { path: '^node_modules/vis-(timeline|data)/' },
  },
];

const SEED_RULES = [
  {
    name: 'seed-uses-the-entry-points',
    comment:
      'The stories run through shared and the one entry point of the service, as any other caller would.',
    severity: 'error',
    from: { path: '^seed/src/' },
    to: { path: '^(ui|service|shared)/', pathNot: `^service/(src|dist)/index\\.|${SHARED}` },
  },
];

const RULES_FOR_ALL = [
  {
    name: 'no-cycles',
    comment: 'Files in a ring can only be understood, loaded and tested all together.',
    severity: 'error',
    from: {},
    to: { circular: true },
  },
  {
    name: 'no-import-of-tests',
    comment: 'A test is a leaf: what two tests need lives in a testing or support folder.',
    severity: 'error',
    from: {},
    to: { path: TEST },
  },
  {
    name: 'no-testing-in-the-product',
    comment:
      'Builders and fakes must not reach people: product code that needs them has something to say for itself.',
    severity: 'error',
    from: { path: '^(shared|service|seed|ui)/src/', pathNot: `${TEST}|${TESTING}` },
    to: { path: `${TESTING}|^shared/dist/testing/|^service/test/|^ui/e2e/` },
  },
  {
    name: 'no-tools-in-the-product',
    comment: 'A package listed for development is not there where the product runs.',
    severity: 'error',
    from: { path: '^(shared|service|seed|ui)/src/', pathNot: `${TEST}|${TESTING}` },
    to: { dependencyTypes: ['npm-dev'], dependencyTypesNot: ['type-only'] },
  },
  {
    name: 'listed-packages-only',
    comment: 'A package that is there by accident of another one goes when that one goes.',
    severity: 'error',
    from: { path: '^(shared|service|seed|ui)/src/' },
    to: { dependencyTypes: ['npm-no-pkg', 'npm-unknown'] },
  },
  {
    name: 'everything-resolves',
    comment: 'An import that leads nowhere escapes every other rule here.',
    severity: 'error',
    from: {},
    to: { couldNotResolve: true },
  },
];

export default {
  forbidden: [...SHARED_RULES, ...SERVICE_RULES, ...UI_RULES, ...SEED_RULES, ...RULES_FOR_ALL],
  options: {
    doNotFollow: { path: 'node_modules|/dist/' },
    tsPreCompilationDeps: true,
    combinedDependencies: true,
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
      extensions: ['.ts', '.tsx', '.js', '.mjs', '.json', '.css', '.d.ts'],
    },
  },
};

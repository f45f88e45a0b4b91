/** @typedef {import('dependency-cruiser').IForbiddenRuleType} Rule */

/** Rooms in order: a room may import rooms of earlier lines, never its neighbours on the same line nor what comes after. */
const ENGINE_ROOMS = [
  ['outcome.ts', 'units.ts'],
  ['media/'],
  ['sketch/'],
  ['train/'],
  ['paraxial/'],
  ['exact/'],
  ['aberration/'],
  ['solve/'],
  ['make/'],
  ['sheet/'],
  ['index.ts'],
];
const APP_ROOMS = [
  ['ui/', 'store/'],
  ['live/'],
  ['board/'],
  ['drawing/'],
  ['ribbon/'],
  ['layout/', 'panels/', 'plots/', 'desk/'],
  ['commands/'],
  ['page/'],
  ['App.'],
  ['main.'],
];

/** @param {readonly string[]} paths */
const anyOf = (paths) => `^(${paths.join('|').replaceAll('.', '[.]')})`;

/**
 * One rule per room: within `house` it imports itself and earlier lines only.
 * @param {string} house
 * @param {readonly (readonly string[])[]} lines
 * @returns {Rule[]}
 */
const roomOrder = (house, lines) =>
  lines.flatMap((line, index) =>
    line.map((room) => ({
      name: `${house}/${room} imports only what comes before it`,
      severity: 'error',
      from: { path: anyOf([`${house}/${room}`]) },
      to: {
        path: `^${house}/`,
        pathNot: anyOf([room, ...lines.slice(0, index).flat()].map((allowed) => `${house}/${allowed}`)),
      },
    })),
  );

/**
 * Two rules: a module outside every room may neither import nor stand alone. (Imported by others, it breaks theirs.)
 * @param {string} house
 * @param {readonly (readonly string[])[]} lines
 * @param {readonly string[]} besides files of the house that are no part of its order
 * @returns {Rule[]}
 */
const knownRooms = (house, lines, besides = []) => {
  const name = `every module of ${house} stands in a known room`;
  const outside = {
    path: `^${house}/`,
    pathNot: anyOf([...lines.flat(), ...besides].map((room) => `${house}/${room}`)),
  };
  return [
    { name, severity: 'error', from: outside, to: {} },
    { name, severity: 'error', from: { ...outside, orphan: true }, to: {} },
  ];
};

/** @type {import('dependency-cruiser').DependencyType[]} */
const PACKAGES = ['npm', 'npm-dev', 'npm-optional', 'npm-peer', 'npm-bundled', 'npm-no-pkg', 'npm-unknown'];

/** @type {Rule[]} */
const forbidden = [
  ...roomOrder('engine', ENGINE_ROOMS),
  ...roomOrder('app', APP_ROOMS),
  ...knownRooms('engine', ENGINE_ROOMS),
  ...knownRooms('app', APP_ROOMS, ['serve.mjs']),
  {
    name: 'no circles',
    severity: 'error',
    from: {},
    to: { circular: true },
  },
  {
    name: 'every import resolves',
    severity: 'error',
    from: {},
    to: { couldNotResolve: true },
  },
  {
    name: 'the engine imports nothing of the app, the tests or public',
    severity: 'error',
    from: { path: '^engine/' },
    to: { path: '^(app|test|e2e|public)/' },
  },
  {
    name: 'the engine imports nothing of Node',
    severity: 'error',
    from: { path: '^engine/' },
    to: { dependencyTypes: ['core'] },
  },
  {
    name: 'the engine imports no package',
    severity: 'error',
    from: { path: '^engine/', pathNot: '^engine/sketch/' },
    to: { dependencyTypes: PACKAGES },
  },
  {
    name: 'engine/sketch imports no package but valibot',
    severity: 'error',
    from: { path: '^engine/sketch/' },
    to: { dependencyTypes: PACKAGES, pathNot: 'node_modules/valibot/' },
  },
  {
    name: 'the app knows the engine by its door only',
    severity: 'error',
    from: { path: '^app/' },
    to: { path: '^engine/', pathNot: '^engine/index[.]ts$' },
  },
  {
    name: 'the app imports nothing of the tests',
    severity: 'error',
    from: { path: '^app/' },
    to: { path: '^(test|e2e)/' },
  },
  {
    name: 'what runs in the browser imports nothing of Node and no development package',
    severity: 'error',
    from: { path: '^app/', pathNot: '^app/serve[.]mjs$' },
    to: {
      dependencyTypes: ['core', 'npm-dev', 'npm-no-pkg', 'npm-unknown'],
      dependencyTypesNot: ['type-only'],
    },
  },
];

export default {
  forbidden,
  options: {
    doNotFollow: { path: 'node_modules' },
    tsPreCompilationDeps: true,
    enhancedResolveOptions: {
      extensions: ['.ts', '.tsx', '.mjs'],
      exportsFields: ['exports'],
      conditionNames: ['import', 'style', 'types', 'default'],
    },
  },
};

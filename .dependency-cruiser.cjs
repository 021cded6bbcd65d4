/** Rooms from high to low. Rooms on one floor do not know each other. Imports go down, and only to a room's index. */
const floors = [
  ['cli'],
  ['papers', 'sheets'],
  ['report', 'pictures'],
  ['extraction'],
  ['studies'],
  ['fast'],
  ['prescriptions'],
  ['bubbles', 'contour', 'masses'],
  ['ambiguity', 'growth', 'borel', 'sequences', 'truncation'],
  ['qcd'],
  ['series'],
  ['numerics'],
];

const rooms = floors.flat();
const inside = (names) => `^src/(${names.join('|')})/`;

/** For each room: everything that is not strictly below it is out of bounds. */
const down = rooms.map((room) => {
  const floor = floors.findIndex((names) => names.includes(room));
  const forbidden = floors
    .slice(0, floor + 1)
    .flat()
    .filter((name) => name !== room);
  return {
    name: `${room}-imports-down-only`,
    severity: 'error',
    comment: `src/${room} may import only from the rooms below it`,
    from: { path: inside([room]) },
    to: { path: forbidden.length > 0 ? inside(forbidden) : '^src/[^/]+\\.ts$' },
  };
});

module.exports = {
  forbidden: [
    ...down,
    {
      name: 'through-the-index',
      severity: 'error',
      comment: "another room is entered through its index.ts only, and the root's public face through src/index.ts",
      from: { path: '^src/([^/]+)/' },
      to: { path: '^src/[^/]+/', pathNot: ['^src/$1/', '^src/[^/]+/index\\.ts$'] },
    },
    {
      name: 'cli-loads-rooms-in-one-piece',
      severity: 'error',
      comment:
        'commands get what they run from import("../rooms.js"); from the rooms themselves they import types only',
      from: { path: '^src/cli/', pathNot: '^src/cli/rooms(-core|-more|-pictures)?\\.ts$' },
      to: { path: '^src/[^/]+/index', pathNot: '^src/cli/', dependencyTypesNot: ['type-only'] },
    },
    {
      name: 'cli-loads-rooms-when-needed',
      severity: 'error',
      comment: 'a static import would load all rooms for every --help',
      from: { path: '^src/cli/' },
      to: { path: '^src/cli/rooms(-core|-more|-pictures)?\\.ts$', dynamic: false },
    },
    {
      name: 'rooms-do-not-import-the-public-face',
      severity: 'error',
      from: { path: '^src/[^/]+/' },
      to: { path: '^src/index\\.ts$' },
    },
    {
      name: 'every-room-has-a-floor',
      severity: 'error',
      comment: 'a new folder of src/ is entered in the list of floors above',
      from: { path: '^src/[^/]+/', pathNot: inside(rooms) },
      to: {},
    },
    { name: 'no-cycles', severity: 'error', from: {}, to: { circular: true } },
    {
      name: 'declared-packages-only',
      severity: 'error',
      from: { path: '^src/' },
      to: { dependencyTypes: ['npm-no-pkg', 'npm-unknown', 'unknown', 'undetermined'] },
    },
    {
      name: 'terminal-libraries-in-the-terminal-rooms-only',
      severity: 'error',
      from: { path: '^src/', pathNot: '^src/(cli|report)/' },
      to: { path: 'node_modules/(yargs|chalk)/' },
    },
    {
      name: 'mathjs-in-the-series-reader-only',
      severity: 'error',
      from: { path: '^src/', pathNot: '^src/series/' },
      to: { path: 'node_modules/mathjs/' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsConfig: { fileName: 'tsconfig.json' },
    tsPreCompilationDeps: true,
    enhancedResolveOptions: { exportsFields: ['exports'], conditionNames: ['import', 'types', 'default'] },
  },
};

/**
 * The rooms of `src`, lowest first. A room imports only rooms that stand before it; `components`
 * may import all of them. The comment of each rule says what to import instead.
 */
const rooms = [
  'parts',
  'circuit',
  'blocks',
  'filter',
  'response',
  'study',
  'clip',
  'audio',
  'design',
  'sheet',
  'bench',
  'cli',
];

/** Imports that the order alone would allow, but that would mix up concerns. */
const strangers = {
  filter: ['circuit', 'blocks'],
  clip: ['circuit', 'blocks', 'filter', 'response', 'study'],
  design: ['audio', 'clip'],
};

const upwards = rooms.map((room, index) => ({
  name: `${room}-imports-upwards`,
  comment: `src/${room} may import only the rooms before it (${rooms.slice(0, index).join(', ') || 'none'}) and src/*.ts. Move what is shared down, or pass it in as an argument.`,
  severity: 'error',
  from: { path: `^src/${room}/` },
  to: { path: [...rooms.slice(index + 1).map((later) => `^src/${later}/`), '^components/'] },
}));

const apart = Object.entries(strangers).map(([room, others]) => ({
  name: `${room}-knows-too-much`,
  comment: `src/${room} must not know ${others.join(' or ')}. A type both need belongs in src/transfer-function.ts or src/units.ts.`,
  severity: 'error',
  from: { path: `^src/${room}/` },
  to: { path: others.map((other) => `^src/${other}/`) },
}));

module.exports = {
  forbidden: [
    ...upwards,
    ...apart,
    {
      name: 'ground-floor',
      comment: 'src/*.ts (units, errors, transfer function) import nothing but each other.',
      severity: 'error',
      from: { path: '^src/[^/]+\\.ts$' },
      to: { path: ['^src/[^/]+/', '^components/'] },
    },
    {
      name: 'no-circular',
      comment: 'Two files that import each other: move what both need into a third.',
      severity: 'error',
      from: {},
      to: { circular: true, dependencyTypesNot: ['type-only'] },
    },
    {
      name: 'audio-libraries-on-demand',
      comment:
        'Import src/audio/engine-types.ts, or src/audio/engine.ts dynamically: no audio code before it is needed.',
      severity: 'error',
      from: { path: '^components/' },
      to: {
        path: ['^src/audio/', 'node_modules/(tone|standardized-audio-context)/'],
        dependencyTypesNot: ['type-only', 'dynamic-import'],
        pathNot: '^src/audio/engine-types\\.ts$',
      },
    },
    {
      name: 'no-test-imports',
      comment: 'Shipped code does not import tests.',
      severity: 'error',
      from: { path: '^(src|components)/' },
      to: { path: '^tests/' },
    },
    {
      name: 'not-to-unresolvable',
      comment: 'The imported file does not exist: mend the path (with its extension).',
      severity: 'error',
      from: {},
      to: { couldNotResolve: true, pathNot: ['\\?(worker|url|raw)', '^virtual:'] },
    },
  ],
  options: {
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    doNotFollow: { path: 'node_modules' },
    enhancedResolveOptions: { extensions: ['.ts', '.mjs', '.js'] },
  },
};

/** The arrows between folders, as DEVELOPERS.md draws them. Each folder lists what it may import besides itself. */

const sharedMay = {
  units: [],
  numerics: ['units'],
  odex: [],
  fluid: ['units', 'numerics'],
  kinds: ['units', 'numerics', 'fluid'],
  symbols: ['units', 'numerics', 'fluid', 'kinds'],
  parts: ['units', 'numerics', 'fluid', 'kinds'],
  duty: ['units', 'numerics', 'fluid', 'kinds'],
  circuit: ['units', 'numerics', 'fluid', 'kinds', 'symbols', 'parts', 'duty'],
  simulation: ['units', 'numerics', 'odex', 'fluid', 'kinds', 'symbols', 'parts', 'duty', 'circuit'],
  findings: ['units', 'numerics', 'fluid', 'kinds', 'symbols', 'parts', 'duty', 'circuit', 'simulation'],
  pictures: ['units', 'numerics', 'fluid', 'kinds', 'symbols', 'parts', 'duty', 'circuit', 'simulation', 'findings'],
  api: ['units', 'numerics', 'fluid', 'kinds', 'symbols', 'parts', 'duty', 'circuit', 'simulation', 'findings'],
};
const srcMay = {
  lib: [],
  stores: ['lib'],
  components: ['lib', 'stores'],
  features: ['lib', 'stores', 'components'],
  app: ['lib', 'stores', 'components', 'features'],
};
/** Plain types that a lower folder may import from a higher one. */
const exceptions = { symbols: '^shared/pictures/shape\\.ts$' };

function arrows(top, may) {
  const folders = Object.keys(may);
  return folders.map((folder) => {
    const others = folders.filter((other) => other !== folder && !may[folder].includes(other));
    return {
      name: `${top}-${folder}`,
      comment: `${top}/${folder} may import ${may[folder].join(', ') || 'nothing else'} of ${top}`,
      severity: 'error',
      from: { path: `^${top}/${folder}/`, pathNot: '\\.test\\.tsx?$' },
      to: { path: `^${top}/(${others.join('|')})/`, ...(exceptions[folder] ? { pathNot: exceptions[folder] } : {}) },
    };
  });
}

module.exports = {
  forbidden: [
    {
      name: 'no-cycles',
      severity: 'error',
      from: {},
      to: { circular: true, viaOnly: { dependencyTypesNot: ['type-only', 'dynamic-import'] } },
    },
    { name: 'must-resolve', severity: 'error', from: {}, to: { couldNotResolve: true, pathNot: '\\?(worker|url|raw)' } },
    {
      name: 'shared-is-alone',
      severity: 'error',
      from: { path: '^shared/', pathNot: '\\.test\\.ts$' },
      to: { path: '^(server|src|tests)/' },
    },
    {
      name: 'shared-packages',
      severity: 'error',
      from: { path: '^shared/', pathNot: '\\.test\\.ts$|^shared/odex/' },
      to: { path: 'node_modules', pathNot: 'node_modules/zod/' },
    },
    {
      name: 'no-node-in-shared',
      severity: 'error',
      from: { path: '^shared/', pathNot: '\\.test\\.ts$' },
      to: { dependencyTypes: ['core'] },
    },
    { name: 'server-not-src', severity: 'error', from: { path: '^server/' }, to: { path: '^src/' } },
    { name: 'src-not-server', severity: 'error', from: { path: '^src/' }, to: { path: '^server/' } },
    {
      name: 'product-not-tests',
      severity: 'error',
      from: { path: '^(server|src|shared)/', pathNot: '\\.test\\.tsx?$' },
      to: { path: '^tests/' },
    },
    {
      name: 'features-apart',
      comment: 'a feature never imports another feature: src/app/routes puts them together',
      severity: 'error',
      from: { path: '^src/features/([^/]+)/' },
      to: { path: '^src/features/([^/]+)/', pathNot: '^src/features/$1/' },
    },
    {
      name: 'server-features-apart',
      severity: 'error',
      from: { path: '^server/features/([^/]+)/', pathNot: '\\.test\\.ts$' },
      to: { path: '^server/features/([^/]+)/', pathNot: '^server/features/$1/' },
    },
    {
      name: 'typeorm-behind-stores',
      comment: 'only server/db and the stores and entities of a feature touch TypeORM',
      severity: 'error',
      from: { path: '^server/', pathNot: '^server/db/|\\.(store|entity)\\.ts$|^server/main\\.ts$|\\.test\\.ts$' },
      to: { path: 'node_modules/typeorm/' },
    },
    ...arrows('shared', sharedMay),
    ...arrows('src', srcMay),
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsPreCompilationDeps: true,
    enhancedResolveOptions: {
      extensions: ['.ts', '.tsx', '.js', '.mjs'],
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
    },
  },
};

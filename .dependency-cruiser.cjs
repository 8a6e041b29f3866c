// The layer table: which folder of src/ may import which, as data; the checker's rules are made from it.

/** Left may import right and itself, nothing else in src/. */
const layers = {
  units: [],
  signal: [],
  protocol: ['units'],
  spec: ['units'],
  analysis: ['signal', 'spec', 'units'],
  simulation: ['signal', 'spec', 'units'],
  findings: ['analysis', 'spec', 'units'],
  remedies: ['findings', 'analysis', 'signal', 'spec', 'units'],
  pictures: ['findings', 'analysis', 'spec', 'units', 'protocol'],
  drawing: ['protocol', 'units'],
  output: ['remedies', 'findings', 'simulation', 'analysis', 'signal', 'spec', 'units', 'pictures', 'drawing', 'protocol'],
  jobs: ['output', 'remedies', 'findings', 'simulation', 'analysis', 'spec', 'units', 'pictures', 'protocol'],
  language: ['remedies', 'findings', 'analysis', 'spec', 'units', 'protocol'],
  server: ['language', 'jobs', 'output', 'pictures', 'protocol'],
  library: ['output', 'jobs', 'findings', 'spec'],
  cli: ['library', 'output', 'jobs', 'findings', 'spec', 'units'],
  extension: ['protocol'],
  preview: ['drawing', 'protocol', 'units'],
};

/** The one home of each outside package. */
const homes = {
  yaml: ['spec'],
  'vscode-languageserver': ['server'],
  'vscode-languageserver-textdocument': ['server'],
  'vscode-languageserver-types': ['language'],
  'vscode-languageclient': ['extension'],
  'vscode-uri': ['server', 'extension'],
  'chart.js': ['preview'],
  vscode: ['extension'],
};

/** Folders whose Node entries may use Node's own modules. */
const nodeFolders = ['cli', 'server/node', 'server/main-node\\.ts', 'server/worker\\.ts', 'extension/main-node\\.ts'];

// A layer is a folder or, for `library`, one file.
const within = (name) => `^src/${name}(/|\\.ts$)`;

const layerRules = Object.entries(layers).map(([name, allowed]) => ({
  name: `layer-${name}`,
  severity: 'error',
  comment: `src/${name} may import only itself and: ${allowed.join(', ') || 'nothing'}`,
  from: { path: within(name) },
  to: { path: '^src/', pathNot: [name, ...allowed].map(within) },
}));

const homeRules = Object.entries(homes).map(([pkg, folders]) => ({
  name: `home-of-${pkg}`,
  severity: 'error',
  comment: `${pkg} is used only in ${folders.join(', ')}`,
  from: { path: '^src/', pathNot: folders.map(within) },
  to: { path: `(^|/)node_modules/${pkg}/|^${pkg}(/|$)` },
}));

module.exports = {
  forbidden: [
    ...layerRules,
    ...homeRules,
    { name: 'no-cycle', severity: 'error', from: {}, to: { circular: true } },
    {
      name: 'node-only-at-the-edge',
      severity: 'error',
      from: { path: '^src/', pathNot: nodeFolders.map((folder) => `^src/${folder}`) },
      to: { dependencyTypes: ['core'] },
    },
    { name: 'no-src-to-test', severity: 'error', from: { path: '^src/' }, to: { path: '^test/' } },
    { name: 'known-layer', severity: 'error', from: { path: '^src/', pathNot: Object.keys(layers).map(within) }, to: {} },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      extensions: ['.ts', '.js', '.json'],
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'types', 'default'],
    },
  },
};

// For the test that compares DEVELOPERS.md with the table; not enumerable, since the checker refuses keys it does not know.
Object.defineProperty(module.exports, 'layers', { value: layers });

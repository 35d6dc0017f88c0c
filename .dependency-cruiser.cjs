/** The layer law: what each layer may import, of ours and of others. Every arrow points down, and tests/architecture keeps it.
 *  A layer is a folder or file; its own files may always import each other. `ours` and `packages` list what else. */

const EVERYWHERE = ['lib/errors.ts', 'lib/units.ts', 'lib/env.ts', 'lib/log.ts', 'lib/in-slices.ts', 'lib/write-whole.ts']
// What reads several of the use-cases: it stands above them.
const EXPORT = 'lib/export/'
const USE_CASES = ['lib/catalog/', 'lib/compute/', 'lib/cells/', 'lib/keys/', 'lib/teams/', 'lib/logbook/']
const PURE = ['lib/urdf/', 'lib/kinematics/', 'lib/math/']

const LAYERS = [
  { layer: 'lib/math/', ours: [], packages: [], core: [] },
  { layer: 'lib/kinematics/', ours: ['lib/math/'], packages: [], core: [] },
  { layer: 'lib/urdf/', ours: ['lib/kinematics/', 'lib/math/', 'lib/errors.ts', 'lib/units.ts'], packages: ['fast-xml-parser'], core: ['crypto'] },
  // The directory of media types is the contract's.
  { layer: 'lib/archive/', ours: ['lib/urdf/', 'lib/contract/mesh-media-types.ts'], packages: ['yauzl', '@types/yauzl'], core: ['buffer', 'crypto', 'zlib'] },
  { layer: 'lib/storage/', ours: ['lib/errors.ts', 'lib/env.ts', 'lib/log.ts', 'lib/in-slices.ts', 'lib/write-whole.ts'], packages: ['@aws-sdk/client-s3'], core: null },
  { layer: 'lib/errors.ts', ours: [], packages: [], core: [] },
  { layer: 'lib/units.ts', ours: [], packages: [], core: [] },
  { layer: 'lib/env.ts', ours: [], packages: [], core: ['path'] },
  { layer: 'lib/in-slices.ts', ours: [], packages: [], core: null },
  { layer: 'lib/write-whole.ts', ours: [], packages: [], core: ['crypto', 'fs', 'fs/promises'] },
  { layer: 'lib/log.ts', ours: ['lib/env.ts'], packages: ['pino'], core: [] },
  // The contract speaks of roles and findings in the words of their owners: types and constant tables, no behaviour.
  { layer: 'lib/contract/', ours: [...EVERYWHERE, 'lib/urdf/description.ts', 'lib/urdf/rules.ts'], packages: ['zod', '@asteasolutions/zod-to-openapi'], core: [] },
  // The schema types two columns by what the importer makes.
  { layer: 'db/', ours: [...EVERYWHERE, 'lib/urdf/description.ts'], packages: ['drizzle-orm', '@electric-sql/pglite', 'pg'], core: null },
  { layer: 'lib/access/', ours: [...EVERYWHERE, 'lib/contract/', 'db/'], packages: null, core: null },
  { layer: 'lib/http/', ours: [...EVERYWHERE, 'lib/access/', 'lib/contract/', 'db/'], packages: null, core: null },
  ...USE_CASES.map((layer) => ({
    layer,
    // A team's slug is derived as a model's is.
    ours: [...EVERYWHERE, ...PURE, 'lib/access/', 'lib/logbook/', 'lib/mail/', 'lib/storage/', 'lib/archive/', 'lib/contract/', 'db/', 'lib/catalog/derive-slug.ts'],
    packages: null,
    core: null,
  })),
  { layer: EXPORT, ours: [...EVERYWHERE, ...PURE, 'lib/access/', 'lib/catalog/', 'lib/compute/', 'lib/storage/', 'lib/contract/', 'db/'], packages: ['yazl', '@types/yazl'], core: null },
  // The document says who may call what.
  { layer: 'openapi/', ours: [...EVERYWHERE, 'lib/contract/', 'lib/access/permissions.ts'], packages: ['zod', '@asteasolutions/zod-to-openapi'], core: null },
  { layer: 'components/', ours: ['lib/contract/', 'lib/errors.ts', 'lib/units.ts', 'lib/kinematics/', 'lib/math/'], packages: null, core: [] },
  { layer: 'app/', ours: [...EVERYWHERE, ...USE_CASES, EXPORT, ...PURE, 'components/', 'lib/http/', 'lib/contract/', 'lib/access/', 'openapi/'], packages: null, core: null },
]

const ALL = '^(app|components|lib|db|openapi|samples|tests|drizzle)/'
const named = (places) => places.join(' ').replace(EVERYWHERE.join(' '), 'the common files')
const pattern = (place) => `^${place.replaceAll('.', '\\.')}${place.endsWith('/') ? '' : '$'}`
const packagePattern = (name) => `(^|/)node_modules/${name}/`

const rules = LAYERS.flatMap(({ layer, ours, packages, core }) => [
  {
    name: `${layer} imports of ours only ${ours.length === 0 ? 'itself' : named(ours)}`,
    severity: 'error',
    from: { path: pattern(layer) },
    to: { path: ALL, pathNot: [layer, ...ours].map(pattern) },
  },
  ...(packages === null
    ? []
    : [
        {
          name: `${layer} imports of packages only ${packages.length === 0 ? 'none' : packages.join(' ')}`,
          severity: 'error',
          from: { path: pattern(layer) },
          to: { path: '(^|/)node_modules/', pathNot: packages.map(packagePattern) },
        },
      ]),
  ...(core === null
    ? []
    : [
        {
          name: `${layer} imports of Node only ${core.length === 0 ? 'nothing' : core.join(' ')}`,
          severity: 'error',
          from: { path: pattern(layer) },
          to: { dependencyTypes: ['core'], ...(core.length === 0 ? {} : { pathNot: `^(node:)?(${core.join('|')})$` }) },
        },
      ]),
])

/** Packages that one place owns. */
const OWNED = [
  { packages: ['drizzle-orm', '@electric-sql/pglite', 'pg'], owner: 'db/' },
  { packages: ['pino'], owner: 'lib/log.ts' },
  { packages: ['fast-xml-parser'], owner: 'lib/urdf/' },
  { packages: ['yauzl'], owner: 'lib/archive/' },
  { packages: ['yazl'], owner: 'lib/export/' },
  { packages: ['@aws-sdk/client-s3'], owner: 'lib/storage/' },
]
const ownership = OWNED.map(({ packages, owner }) => ({
  name: `only ${owner} imports ${packages.join(' ')}`,
  severity: 'error',
  from: { path: '^(app|components|lib|db|openapi|samples)/|^instrumentation', pathNot: pattern(owner) },
  to: { path: packages.map(packagePattern) },
}))

module.exports = {
  forbidden: [
    ...rules,
    ...ownership,
    { name: 'no import leads back to where it started', severity: 'error', from: {}, to: { circular: true } },
    { name: 'every import is found', severity: 'error', from: {}, to: { couldNotResolve: true } },
    {
      name: 'a route file imports only the edge, the use-cases and the OpenAPI document',
      severity: 'error',
      from: { path: '^app/api/v1/.*route\\.ts$' },
      to: { path: ALL, pathNot: ['lib/http/', ...USE_CASES, EXPORT, 'openapi/'].map(pattern) },
    },
    { name: 'only tests import tests', severity: 'error', from: { pathNot: '^tests/' }, to: { path: '^tests/' } },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '^(\\.next|drizzle/)' },
    tsConfig: { fileName: 'tsconfig.json' },
    tsPreCompilationDeps: true,
    enhancedResolveOptions: { exportsFields: ['exports'], conditionNames: ['import', 'require', 'node', 'default', 'types'], mainFields: ['module', 'main', 'types'] },
  },
}

// Imports go one way. Screens: app → features → components → lib → shared. Server: routes → verbs → queries → db.
const feature = '^frontend/src/features/([^/]+)/';
const noun = '^backend/src/resources/([^/]+)/';

module.exports = {
  forbidden: [
    { name: 'no-circular', severity: 'error', from: {}, to: { circular: true } },
    { name: 'shared-stands-alone', severity: 'error', from: { path: '^shared/' }, to: { path: '^(frontend|backend)/' } },
    { name: 'backend-and-frontend-apart', severity: 'error', from: { path: '^backend/' }, to: { path: '^frontend/' } },
    { name: 'frontend-and-backend-apart', severity: 'error', from: { path: '^frontend/' }, to: { path: '^backend/' } },
    {
      name: 'engine-is-pure',
      comment: 'no package, nothing outside the engine',
      severity: 'error',
      from: { path: '^shared/src/engine/', pathNot: '\\.test\\.ts$' },
      to: { pathNot: '^shared/src/engine/' },
    },
    {
      name: 'engine-primitives-first',
      severity: 'error',
      from: { path: '^shared/src/engine/(units|estimate|vec3|rotation)\\.ts$' },
      to: { path: '^shared/src/engine/(?!units|estimate|vec3|rotation)' },
    },
    {
      name: 'schemas-before-questions',
      severity: 'error',
      from: { path: '^shared/src/(schemas|csv)/' },
      to: { path: '^shared/src/(questions|engine)' },
    },
    {
      name: 'features-apart',
      comment: 'what two features share goes to components or lib',
      severity: 'error',
      from: { path: feature },
      to: { path: '^frontend/src/features/', pathNot: '^frontend/src/features/$1/' },
    },
    {
      name: 'features-below-app',
      severity: 'error',
      from: { path: '^frontend/src/(features|components|drawings|lib)/' },
      to: { path: '^frontend/src/app/(?!paths)' },
    },
    {
      name: 'components-below-features',
      severity: 'error',
      from: { path: '^frontend/src/(components|drawings|lib)/' },
      to: { path: '^frontend/src/features/' },
    },
    {
      name: 'lib-at-the-bottom',
      severity: 'error',
      from: { path: '^frontend/src/lib/' },
      to: { path: '^frontend/src/(components|drawings|features|app)/' },
    },
    {
      name: 'db-below-http',
      severity: 'error',
      from: { path: '^backend/src/db/(connect|migrate|schema)' },
      to: { path: '^backend/src/(http|auth|resources)/' },
    },
    {
      name: 'only-routes-know-http',
      severity: 'error',
      from: { path: noun, pathNot: '(routes|list-catalog|receive-file|\\.test)\\.ts$' },
      to: { path: '^backend/src/http/' },
    },
    {
      name: 'no-tests-in-the-product',
      severity: 'error',
      from: { path: '^(shared|backend|frontend)/src/', pathNot: '\\.test\\.tsx?$' },
      to: { path: '(\\.test\\.tsx?$|^tests/)' },
    },
  ],
  options: {
    tsPreCompilationDeps: true,
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(/dist/|\\.generated\\.)' },
    tsConfig: { fileName: 'tsconfig.base.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
      extensions: ['.ts', '.tsx', '.js', '.mjs', '.cjs'],
    },
  },
};

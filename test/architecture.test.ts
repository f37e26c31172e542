import { cruise, type ICruiseResult, type IForbiddenRuleType } from 'dependency-cruiser'
import { beforeAll, expect, test } from 'vitest'
import { careKinds } from '#app/care/kinds.ts'
import { functionsOf, isTest, linesMatching, type SourceFile, sources, undocumented } from './architecture/sources.ts'

/** Which folder of app/ may import which others. What is left out of it, such as routes, may import all. */
const mayImport: Readonly<Record<string, readonly string[]>> = {
  time: [],
  clinical: ['time'],
  care: ['clinical', 'time'],
  catalogue: ['care', 'clinical', 'time'],
  rules: ['care', 'clinical', 'time'],
  charting: ['rules', 'care', 'clinical', 'time'],
  scanning: ['charting', 'catalogue', 'rules', 'care', 'clinical', 'time'],
  supplies: ['charting', 'catalogue', 'care', 'clinical', 'time'],
  components: ['supplies', 'scanning', 'charting', 'catalogue', 'rules', 'care', 'clinical', 'time'],
}
const pure = '^app/(time|clinical|care|catalogue|rules|supplies)/'

const rules: IForbiddenRuleType[] = [
  ...Object.entries(mayImport).map(([folder, others]) => ({
    name: `${folder} imports only ${others.join(', ') || 'itself'}`,
    from: { path: `^app/${folder}/` },
    to: { path: '^(app|database|test)/', pathNot: `^app/(${[folder, ...others].join('|')})/` },
  })),
  { name: 'pure code needs no platform', from: { path: pure }, to: { dependencyTypes: ['core'] } },
  {
    name: 'pure code needs no package but zod, dayjs and CSV',
    from: { path: pure },
    to: { path: 'node_modules/', pathNot: 'node_modules/(zod|dayjs|csv-parse|csv-stringify)/' },
  },
  { name: 'nothing imports a route', from: {}, to: { path: '^app/routes/', pathNot: '\\+types' } },
  {
    name: 'only server modules reach the database',
    from: { path: '^app/(?!routes/)', pathNot: '\\.server\\.tsx?$' },
    to: { path: '^database/', dependencyTypesNot: ['type-only'] },
  },
  {
    name: 'only the database knows Sequelize',
    from: { pathNot: '^(database|test)/' },
    to: { path: 'node_modules/(sequelize|mariadb|umzug)/' },
  },
  { name: 'models stay in the database', from: { pathNot: '^(database|test)/' }, to: { path: '^database/models/' } },
  {
    name: 'the database knows care and catalogue, not how it is shown or judged',
    from: { path: '^database/', pathNot: '^database/(seeders|commands)/' },
    to: { path: '^app/', pathNot: '^app/((care|catalogue|clinical|time)/|auth/permissions\\.ts|env\\.server\\.ts)' },
  },
  {
    name: 'a migration means the same in five years',
    from: { path: '^database/migrations/' },
    to: { path: '^(app|database)/', pathNot: '^database/migrations/' },
  },
  {
    name: 'no circles',
    from: {},
    to: { circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } },
  },
]

let cruised: ICruiseResult
const code = sources(['app', 'database', 'test', 'server.ts'])
const shipped = code.filter(file => !isTest(file))

beforeAll(async () => {
  const { output } = await cruise(
    ['app', 'database', 'server.ts'],
    {
      baseDir: new URL('..', import.meta.url).pathname,
      validate: true,
      ruleSet: { forbidden: rules },
      exclude: { path: ['\\.test\\.tsx?$', '/make\\.ts$', '\\.react-router'] },
      doNotFollow: { path: 'node_modules' },
      tsPreCompilationDeps: true,
    },
    { conditionNames: ['import', 'node', 'default', 'types'], exportsFields: ['exports'] },
    { tsConfig: {} },
  )
  if (typeof output === 'string') throw new Error(output)
  cruised = output
}, 60_000)

test.each(rules.map(({ name }) => name ?? ''))('%s', name => {
  const violations = cruised.summary.violations.filter(violation => violation.rule.name === name)
  expect(violations.map(({ from, to }) => `${from} imports ${to}`)).toEqual([])
})

test('every import is found', () => {
  const lost = cruised.modules.flatMap(({ source, dependencies }) =>
    dependencies
      .filter(({ couldNotResolve, module }) => couldNotResolve && !/\+types|virtual:|\.css$|\?url$/.test(module))
      .map(({ module }) => `${source} imports ${module}`),
  )
  expect(lost).toEqual([])
})

function budget({ path }: SourceFile) {
  if (/^app\/routes\//.test(path) && !path.includes('.test.')) return 150
  if (/^database\/(seeders|migrations)\//.test(path)) return 300
  return isTest({ path }) ? 250 : 200
}

test('no file has grown past its budget', () => {
  const long = code.filter(file => file.lines.length > budget(file))
  expect(long.map(file => `${file.path} has ${file.lines.length} lines of ${budget(file)}`)).toEqual([])
})

test('no function has grown past its budget', () => {
  const most = ({ path, name }: { path: string; name: string }) =>
    name === 'loader' ? 30 : path.endsWith('.tsx') && /^[A-Z]/.test(name) ? 80 : 40
  const long = shipped.flatMap(functionsOf).filter(one => one.lines > most(one))
  expect(long.map(one => `${one.path}: ${one.name} has ${one.lines} lines of ${most(one)}`)).toEqual([])
})

test('rules have no clock and no chance in them', () => {
  const pureCode = shipped.filter(({ path }) => new RegExp(`${pure}|^app/(charting|scanning)/`).test(path))
  expect(
    linesMatching(pureCode, /Date\.now\(|new Date\(\)|Math\.random|\.get(Hours|Date|Day|Month|FullYear)\(/),
  ).toEqual([])
})

test('the environment is read in one place', () => {
  const readers = /^app\/env\.server\.ts$|^database\/(environment\.ts|run\/|commands\/)/
  expect(
    linesMatching(
      shipped.filter(({ path }) => !readers.test(path)),
      /process\.env/,
    ),
  ).toEqual([])
})

test('a kind is named nowhere but in its own folder', () => {
  const slugs = new RegExp(`['"\`/](${careKinds.map(({ slug }) => slug).join('|')})['"\`]`)
  const elsewhere = shipped.filter(({ path }) => !/^app\/care\/[^/]+\/|^database\/seeders\/|refused-words/.test(path))
  const named = linesMatching(elsewhere, slugs).filter(line => !/import .* from |^\S+ import\(/.test(line))
  expect(named).toEqual([])
})

test('nothing is left unfinished, untyped or untested on purpose', () => {
  const others = code.filter(({ path }) => path !== 'test/architecture.test.ts')
  expect(
    linesMatching(
      others,
      /\b(TODO|FIXME|XXX)\b|@ts-(ignore|nocheck)|(test|it|describe)\.(skip|only|todo)\(|vi\.mock\(/,
    ),
  ).toEqual([])
})

test('every exported function of the core says what it gives', () => {
  const core = shipped.filter(({ path }) =>
    /^app\/(time|clinical|care|catalogue|rules|auth)\/|^database\/[^/]+\.ts$/.test(path),
  )
  expect(core.flatMap(undocumented)).toEqual([])
})

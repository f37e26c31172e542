import { expect, test } from 'vitest'
import type { PatientFacts, StoredEntry } from '../kind.ts'
import { type AboutContext, aContext, anEntry, aTube } from '../make.ts'
import { type TubeData, tubeChanges } from '../tube-change/schema.ts'
import { replacedWithNew } from './examples.ts'
import { type InnerCannulaData, innerCannulaActs } from './schema.ts'
import { innerCannulaWarnings } from './warnings.ts'

const inAlder: Partial<InnerCannulaData> = { line: 'Alder', size: '8.0' }

interface About extends AboutContext {
  readonly tube?: Partial<TubeData>
  readonly before?: readonly StoredEntry[]
}

function warningsOf(overrides: Partial<InnerCannulaData>, { tube = {}, before = [], ...about }: About = {}) {
  const entries = [anEntry(tubeChanges, '2026-03-02 10:00', aTube(tube)), ...before]
  return innerCannulaWarnings({ ...replacedWithNew, ...inAlder, ...overrides }, aContext(entries, '12:00', about))
}

const unable = { act: 'unable', condition: 'not seen', locked: undefined } as const

test('the usual act warns of nothing', () => {
  expect(warningsOf({})).toEqual([])
})

test.each(['heavy', 'blocked'] as const)('a %s cannula is amber, with a recheck in two hours', condition => {
  expect(warningsOf({ condition })).toMatchObject([
    {
      name: 'inner-cannula-narrowed',
      level: 'amber',
      action: 'Fit a clean inner cannula. Check again in 2 hours. Review humidity.',
    },
  ])
})

test.each(['clear', 'light', 'moderate'] as const)('a cannula found %s is no warning', condition => {
  expect(warningsOf({ condition })).toEqual([])
})

test('distress is red by the upper airway', () => {
  const action = (upperAirway: PatientFacts['upperAirway']) =>
    warningsOf({ tolerance: 'distress' }, { patient: { upperAirway } })[0]?.action
  expect(action('open')).toBe(
    'Call for help now. Give oxygen to the face and the stoma. Take off any valve or cap, remove the inner cannula, then try a suction catheter. Follow your local emergency plan.',
  )
  expect(action('not known')).toBe(action('open'))
  expect(action('not open')).toBe(
    'Call for help now. Give oxygen to the stoma. The mouth does not connect to the lungs. Follow your local emergency plan.',
  )
})

test.each([
  [
    'not back',
    'inner',
    'red',
    'Fit the correct inner cannula now. Without it the bag may not connect. Follow your local emergency plan.',
  ],
  [
    'none to fit',
    'inner',
    'red',
    'Fit the correct inner cannula now. Without it the bag may not connect. Follow your local emergency plan.',
  ],
  ['not back', 'outer', 'amber', 'Fit the correct inner cannula now.'],
  ['none to fit', 'none', 'amber', 'Fit the correct inner cannula now.'],
] as const)('left out because %s, connector %s: %s', (whyUnable, connector, level, action) => {
  expect(warningsOf({ ...unable, whyUnable }, { tube: { connector } })).toMatchObject([
    { name: 'inner-cannula-absent', level, action },
  ])
})

test('left out of a tube that the record does not know is red', () => {
  const data = { ...replacedWithNew, ...unable, whyUnable: 'not back' } as const
  expect(innerCannulaWarnings(data, aContext([], '12:00'))).toMatchObject([
    { name: 'inner-cannula-absent', level: 'red' },
  ])
})

test.each(['stuck', 'not tolerated', 'other'] as const)('not done because %s is amber', whyUnable => {
  expect(warningsOf({ ...unable, whyUnable })).toMatchObject([{ name: 'inner-cannula-not-checked', level: 'amber' }])
})

test.each([[{ line: 'Corvane' }], [{ size: '7.5' }], [{ line: 'Alder XL' }], [{ size: '8 cuffless' }]])(
  'a cannula charted as %o in an Alder 8.0 is red, also when found so',
  overrides => {
    for (const act of ['replaced', 'inspected'] as const) {
      expect(warningsOf({ ...overrides, act })).toMatchObject([
        {
          name: 'inner-cannula-other-tube',
          level: 'red',
          action:
            'This cannula is not made for this tube. Change it now for the matching one. Follow your local emergency plan.',
        },
      ])
    }
  },
)

test.each([
  [{ line: ' alder ' }],
  [{ line: 'ALDER' }],
  [{ size: '8' }],
  [{ size: '8,0' }],
  [{ line: undefined, size: undefined, act: 'inspected' as const }],
])('a cannula charted as %o is that of an Alder 8.0', overrides => {
  expect(warningsOf(overrides)).toEqual([])
})

test.each([
  ['cleaned', 'disposable', 'amber'],
  ['swapped', 'disposable', 'amber'],
  ['replaced', 'disposable', undefined],
  ['inspected', 'disposable', undefined],
  ['cleaned', 'reusable', undefined],
] as const)('%s for a %s one: %s', (act, innerCannula, level) => {
  const [warning] = warningsOf({ act }, { tube: { innerCannula } })
  expect(warning?.level).toBe(level)
  if (level) expect(warning?.action).toBe('This is single use. Replace it with a new one.')
})

test('no spare and not locked are amber', () => {
  expect(warningsOf({ spare: 'no', locked: 'no' })).toMatchObject([
    { name: 'inner-cannula-not-locked', level: 'amber' },
    { name: 'inner-cannula-no-spare', level: 'amber' },
  ])
})

test.each([
  ['2026-03-09 12:00', true],
  ['2026-03-09 11:59', false],
])('a block after one on %s calls the specialist: %s', (when, called) => {
  const before = [anEntry(innerCannulaActs, when, { ...replacedWithNew, condition: 'blocked' })]
  const names = warningsOf({ condition: 'blocked' }, { before }).map(warning => warning.name)
  expect(names.includes('inner-cannula-repeat-block')).toBe(called)
})

test('fresh blood on the cannula is red and streaks are amber', () => {
  expect(warningsOf({ blood: 'fresh' })).toMatchObject([{ name: 'inner-cannula-blood', level: 'red' }])
  expect(warningsOf({ blood: 'streaks' })).toMatchObject([{ name: 'inner-cannula-blood', level: 'amber' }])
  expect(warningsOf({ blood: 'none' })).toEqual([])
})

test('every red warning ends with the local plan', () => {
  const reds = [
    ...warningsOf({ tolerance: 'distress', blood: 'heavy', line: 'Corvane' }),
    ...warningsOf({ ...unable, whyUnable: 'not back' }, { tube: { connector: 'inner' } }),
  ].filter(warning => warning.level === 'red')
  expect(reds).toHaveLength(4)
  for (const red of reds) expect(red.action).toMatch(/Follow your local emergency plan\.$/)
})

import { expect, test } from 'vitest'
import { cuffPressure } from '../care/cuff-pressure/kind.ts'
import { type CuffData, cuffChecks } from '../care/cuff-pressure/schema.ts'
import type { AnyCareKind } from '../care/kind.ts'
import { careKinds } from '../care/kinds.ts'
import { type AboutContext, aContext, anEntry, aTube } from '../care/make.ts'
import { tubeChanges } from '../care/tube-change/schema.ts'
import { entryWarnings, NO_CHILD_RULES_NAME, standingWarnings } from './warnings.ts'
import { explained, explainedGauges, whyEntry, whyStanding } from './why-warnings.ts'

const tube = anEntry(tubeChanges, '2026-03-09 02:00', aTube())
const context = (about: AboutContext = {}) => aContext([tube], '12:00', about)
const high: CuffData = { found: 34, unit: 'cmH2O', method: 'manometer' }
const numbersOf = (about: AboutContext, name = 'cuff-high') =>
  whyEntry(cuffPressure, high, context(about))[name]?.values.map(
    ({ label, value, origin }) => `${label}: ${value} ${origin}`,
  )

test('a warning about an act answers with its source, the numbers it read and the policy', () => {
  const why = whyEntry(cuffPressure, high, context({ policy: { 'cuff-pressure-upper-limit': 28 } }))['cuff-high']
  expect(why?.rule).toEqual([
    'Source of this rule: Seegobin and van Hasselt, BMJ 1984: 30 cmH2O should not be exceeded; UK practice often 25.',
  ])
  expect(why?.values).toContainEqual({
    label: 'Cuff pressure, upper limit',
    value: '28 cmH2O',
    origin: 'Policy',
    source: 'Seegobin and van Hasselt, BMJ 1984: 30 cmH2O should not be exceeded; UK practice often 25',
    standing: 'published',
  })
  expect(why?.policy).toBe('Tracheostomy care, version 1, reviewed by M. Osei on 02-Jan-2026.')
})

test.each<[string, AboutContext, string]>([
  ['the product', {}, 'Cuff pressure, upper limit: 30 cmH2O Product default'],
  ['the policy', { policy: { 'cuff-pressure-upper-limit': 28 } }, 'Cuff pressure, upper limit: 28 cmH2O Policy'],
  [
    'the care plan',
    { personal: { 'cuff-pressure-upper-limit': 25 } },
    "Cuff pressure, upper limit: 25 cmH2O This patient's plan, As agreed on the round (M. Osei, review by 20-Mar-2026)",
  ],
])('a number says that it is of %s', (_, about, expected) => {
  expect(numbersOf(about)).toContainEqual(expected)
})

test('a band answers with its limits alone', () => {
  const [band] = explainedGauges(cuffPressure, context({ policy: { 'cuff-pressure-upper-limit': 28 } }))
  expect(band).toMatchObject({ field: 'found', lower: 20, upper: 28 })
  expect(band?.why.rule).toEqual(['In range from 20 to 28 cmH2O, both included.'])
  expect(band?.why.values.map(({ label }) => label)).toEqual([
    'Cuff pressure, lower limit',
    'Cuff pressure, upper limit',
  ])
})

test('every warning about an example of any kind has an answer with a source', () => {
  const kinds: readonly AnyCareKind[] = careKinds
  const asked = kinds.flatMap(kind =>
    kind.examples.flatMap(data =>
      explained(entryWarnings(kind, data, context()), whyEntry(kind, data, context())).map(
        ({ name, why }) => `${kind.slug} ${name}: ${why?.rule.join()}`,
      ),
    ),
  )
  expect(asked.length).toBeGreaterThan(20)
  expect(asked.filter(words => !/: Source of this rule: .{4,}[.?!]$/.test(words))).toEqual([])
})

test('what stands has an answer, nothing else has', () => {
  const left = anEntry(cuffChecks, '11:30', { ...high, leftAt: 34 })
  const now = aContext([tube, left], '12:00')
  expect(Object.keys(whyStanding(now)).toSorted()).toEqual(
    standingWarnings(now)
      .map(({ name }) => name)
      .toSorted(),
  )
  expect(Object.keys(whyStanding(now))).toContain('cuff-high')
})

test('that nothing is computed for a child is answered with the age it goes by', () => {
  const child = context({ patient: { bornOn: '2016-05-01' } })
  expect(whyStanding(child)[NO_CHILD_RULES_NAME]?.values.map(({ label, value }) => `${label} ${value}`)).toEqual([
    'Rules for adults apply from the age of 16 years',
  ])
})

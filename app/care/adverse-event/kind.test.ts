import { expect, test } from 'vitest'
import type { PatientFacts, StoredEntry } from '../kind.ts'
import { aContext, anEntry, aTube } from '../make.ts'
import { type TubeData, tubeChanges } from '../tube-change/schema.ts'
import { adverseEventExamples, clearedBlock } from './examples.ts'
import { adverseEvent } from './kind.ts'
import { type AdverseEventData, adverseEventSchema, adverseEvents } from './schema.ts'
import { adverseEventSentence } from './sentence.ts'
import { adverseEventWarnings } from './warnings.ts'

const arrival = { reason: 'on arrival', insertedOn: '2026-03-01', technique: 'surgical' } as const
const tubeOf = (stomaMadeOn: string, overrides: Partial<TubeData> = {}) =>
  anEntry(tubeChanges, '2026-03-01 09:00', aTube({ ...arrival, stomaMadeOn, ...overrides }))
const oldOpening = tubeOf('2026-01-10')

type About = Parameters<typeof aContext>[2]

const warningsOf = (data: AdverseEventData, about: About = {}, entries: readonly StoredEntry[] = [oldOpening]) =>
  adverseEventWarnings(data, aContext(entries, '12:00', about))
const namesOf = (...args: Parameters<typeof warningsOf>) =>
  warningsOf(...args).map(({ name, level }) => `${name} ${level}`)

const told = { told: ['doctor'] } as const satisfies Partial<AdverseEventData>
const event = (overrides: Partial<AdverseEventData>): AdverseEventData => ({ ...clearedBlock, ...told, ...overrides })

test('events read as short sentences', () => {
  expect(adverseEventExamples.map(adverseEventSentence)).toEqual([
    'Adverse event: tube blocked. Help called, inner cannula taken out, suctioned. Recovered. Told: charge nurse, doctor.',
    'Adverse event: tube came out. Tube out now. Help called, oxygen given. Not settled yet. Told: emergency team. Turned in bed; ties had come loose.',
    'Adverse event: tube displaced. Tube in place now. Tube put back or replaced. Moved to higher care. Told: doctor, family.',
    'Adverse event: bleeding. Help called. Not settled yet. Told: doctor, tracheostomy team.',
    'Adverse event: valve or cap on with the cuff up. Valve or cap taken off. Recovered. Told: charge nurse.',
    'Adverse event: wrong inner cannula in. Nothing yet. Recovered. Told: nobody yet.',
    'Adverse event: pressure injury. Pressure taken off. Recovered. Told: charge nurse.',
    'Adverse event: Oxygen tubing came off. Oxygen given. Recovered. Told: charge nurse.',
  ])
})

test.each<[object, readonly string[] | undefined]>([
  [{}, undefined],
  [{ event: 'other' }, ['Enter the other event']],
  [{ event: 'unplanned removal' }, ['Choose the tube now']],
  [{ tubeNow: 'in' }, ['Leave out the tube now here']],
  [{ done: ['nothing', 'oxygen'] }, ['Nothing yet does not go with another measure']],
  [{ told: ['nobody', 'doctor'] }, ['Nobody yet does not go with somebody told']],
])('an event with %j', (overrides, expected) => {
  const { error } = adverseEventSchema.safeParse({ ...clearedBlock, ...overrides })
  expect(error?.issues.map(({ message }) => message)).toEqual(expected)
})

const followUp = ['event-follow-up blue']

test.each<[Partial<AdverseEventData>, readonly string[]]>([
  [{}, followUp],
  [{ outcome: 'moved' }, followUp],
  [{ outcome: 'not settled' }, ['event-not-settled red']],
  [{ outcome: 'died' }, []],
  [{ event: 'displaced', tubeNow: 'in' }, followUp],
  [{ event: 'displaced', tubeNow: 'in', outcome: 'not settled' }, ['event-not-settled red']],
  [{ event: 'displaced', tubeNow: 'out' }, ['event-tube-out red']],
  [{ event: 'unplanned removal', tubeNow: 'in' }, followUp],
  [{ event: 'unplanned removal', tubeNow: 'out' }, ['event-tube-out red']],
  [{ event: 'unplanned removal', tubeNow: 'out', outcome: 'died' }, []],
  [{ event: 'bleeding' }, ['event-bleeding red']],
  [{ event: 'bleeding', outcome: 'not settled' }, ['event-bleeding red']],
  [{ event: 'valve with cuff up', done: ['oxygen'] }, ['event-valve-with-cuff-up red']],
  [{ event: 'valve with cuff up', done: ['valve off'] }, followUp],
  [{ event: 'valve with cuff up', done: ['valve off'], outcome: 'not settled' }, ['event-not-settled red']],
  [{ event: 'wrong cannula', done: ['nothing'] }, ['event-wrong-cannula red']],
  [{ event: 'wrong cannula', done: ['cannula changed'] }, followUp],
  [{ event: 'pressure injury', done: ['pressure off'] }, ['event-pressure-injury amber']],
  [{ event: 'other', what: 'Tubing came off', outcome: 'not settled' }, ['event-not-settled red']],
  [{ told: ['nobody'] }, ['event-nobody-told amber', ...followUp]],
])('%j warns of %j', (overrides, expected) => {
  expect(namesOf(event(overrides))).toEqual(expected)
})

const PLAN = 'Follow your local emergency plan.'
const both =
  'Call for help now. Give oxygen to the face and the stoma. Take off any valve or cap, remove the inner cannula, then try a suction catheter.'

test.each<[PatientFacts['upperAirway'], string]>([
  ['open', `${both} ${PLAN}`],
  ['not known', `${both} ${PLAN}`],
  ['not open', `Call for help now. Give oxygen to the stoma. The mouth does not connect to the lungs. ${PLAN}`],
])('what has not settled follows the upper airway: %s', (upperAirway, action) => {
  const [warning] = warningsOf(event({ outcome: 'not settled' }), { patient: { upperAirway } })
  expect(warning?.action).toBe(action)
})

const out = event({ event: 'unplanned removal', tubeNow: 'out', outcome: 'not settled' })

test.each<[PatientFacts['upperAirway'], string, string]>([
  ['open', '2026-01-10', `Call for help now. Oxygen to face and stoma. ${PLAN}`],
  ['open', '2026-03-04', `Call for help now. Oxygen to face and stoma. Do not push the tube back blindly. ${PLAN}`],
  [
    'not open',
    '2026-01-10',
    `Call for help now. Oxygen to the stoma. The mouth does not connect to the lungs. ${PLAN}`,
  ],
  [
    'not open',
    '2026-03-04',
    `Call for help now. Oxygen to the stoma. The mouth does not connect to the lungs. Do not push the tube back blindly. ${PLAN}`,
  ],
])('a tube that is out, airway %s, opening of %s', (upperAirway, made, action) => {
  const [warning] = warningsOf(out, { patient: { upperAirway } }, [tubeOf(made)])
  expect(warning?.action).toBe(action)
})

test('where nothing is known of the opening, the tube is not pushed back', () => {
  const [warning] = warningsOf(out, {}, [])
  expect(warning?.action).toContain('Do not push the tube back blindly.')
  expect(warning?.cause).toContain('When the opening was made is not charted.')
})

test('a bleed leaves the tube in, with its cuff up', () => {
  expect(warningsOf(event({ event: 'bleeding' }))[0]?.action).toBe(
    `Call for help now and stay with the patient. Leave the tube in; if it has a cuff, keep it up. Treat this as a warning bleed. ${PLAN}`,
  )
})

test.each<[TubeData['cuff'], RegExp]>([
  ['air', /^Take the valve off now\. The patient may not be able to breathe out\./],
  ['foam', /^Take the valve off now\. This cuff cannot be fully emptied\./],
])('a valve over a cuff of %s', (cuff, action) => {
  const data = event({ event: 'valve with cuff up', done: ['help called'] })
  expect(warningsOf(data, {}, [tubeOf('2026-01-10', { cuff })])[0]?.action).toMatch(action)
})

test('a second tube that came out within seven days asks for the specialist; policy sets the days', () => {
  const back = event({ event: 'unplanned removal', tubeNow: 'in' })
  const before = (when: string) => [oldOpening, anEntry(adverseEvents, when, back)]
  const again = 'tube-out-again amber'
  expect(namesOf(back, {}, before('2026-03-03 12:00'))).toContain(again)
  expect(namesOf(back, {}, before('2026-03-03 11:59'))).not.toContain(again)
  expect(namesOf(back, { policy: { 'repeat-tube-out-window': 14 } }, before('2026-03-03 11:59'))).toContain(again)
  expect(namesOf(event({}), {}, before('2026-03-05 12:00'))).not.toContain(again)
})

test('an event is never due and always stands out', () => {
  expect(adverseEvent.tasks).toBeUndefined()
  expect(adverseEvent.outOfRange?.(clearedBlock, aContext([], '12:00'))).toBe(true)
})

import { expect, test } from 'vitest'
import { aboveCuffSuctions } from '../above-cuff-suction/schema.ts'
import { type AdverseEventData, adverseEvents } from '../adverse-event/schema.ts'
import { replacedWithNew } from '../inner-cannula/examples.ts'
import { innerCannulaActs } from '../inner-cannula/schema.ts'
import type { StoredEntry } from '../kind.ts'
import { aContext, anEntry, aTube } from '../make.ts'
import { usualCheck } from '../stoma-and-skin/examples.ts'
import { stomaChecks } from '../stoma-and-skin/schema.ts'
import { type TubeData, tubeChanges } from '../tube-change/schema.ts'
import { bleedWatch } from './bleed-watch.ts'
import { plainSuction } from './examples.ts'
import { suctions } from './schema.ts'

const first = anEntry(tubeChanges, '2026-03-02 10:00', aTube({ reason: 'first insertion', technique: 'surgical' }))
const suctioned = (when: string, blood: 'none' | 'streaks' | 'fresh' | 'heavy') =>
  anEntry(suctions, when, { ...plainSuction, blood })
const cannula = (when: string, blood: 'none' | 'fresh') =>
  anEntry(innerCannulaActs, when, { ...replacedWithNew, blood })
const stoma = (when: string, bleeding: 'none' | 'spotting' | 'fresh ooze') =>
  anEntry(stomaChecks, when, { ...usualCheck, appearance: ['redness'], bleeding })
const tube = (when: string, overrides: Partial<TubeData> = {}) => anEntry(tubeChanges, when, aTube(overrides))

const drawn = (when: string, blood: 'none' | 'fresh') =>
  anEntry(aboveCuffSuctions, when, { volumeMl: 4, port: 'open', blood })
const event = (when: string, outcome: AdverseEventData['outcome']) =>
  anEntry(adverseEvents, when, { event: 'bleeding', done: ['help called'], outcome, told: ['doctor'] })

const seen = (entries: readonly StoredEntry[], now = '14:00') =>
  bleedWatch(aContext([first, ...entries], now)).map(({ name, level }) => `${name} ${level}`)

const watched = ['warning-bleed amber']

test.each<[string, readonly StoredEntry[], readonly string[]]>([
  ['nothing without a bleed', [suctioned('11:00', 'none')], []],
  ['nothing of streaks or spotting', [suctioned('11:00', 'streaks'), stoma('11:00', 'spotting')], []],
  ['nothing while the red of the bleed stands', [suctioned('11:00', 'fresh')], []],
  ['a bleed that has stopped', [suctioned('11:00', 'heavy'), suctioned('12:00', 'none')], watched],
  ['a bleed on the inner cannula that has stopped', [cannula('11:00', 'fresh'), cannula('12:00', 'none')], watched],
  ['a bleed at the stoma that has stopped', [stoma('11:00', 'fresh ooze'), stoma('12:00', 'none')], watched],
  ['a bleed at a tube change, from then on', [tube('11:00', { bleeding: 'active' })], watched],
  ['a bleed above the cuff that has stopped', [drawn('11:00', 'fresh'), drawn('12:00', 'none')], watched],
  ['nothing while the red of a bleed above the cuff stands', [drawn('11:00', 'fresh')], []],
  ['a bleed charted as an event that was over', [event('11:00', 'recovered')], watched],
  ['nothing while the red of that event stands', [event('11:00', 'not settled')], []],
  ['an event that a later look found over', [event('11:00', 'not settled'), suctioned('12:00', 'none')], watched],
  [
    'a bleed before the tube was changed, whose red went with the tube',
    [suctioned('11:00', 'fresh'), tube('12:00')],
    watched,
  ],
])('kept in sight: %s', (_, entries, expected) => {
  expect(seen(entries)).toEqual(expected)
})

test.each([
  ['2026-03-12 11:00', watched],
  ['2026-03-12 11:01', []],
])('a bleed of 10-Mar 11:00 is kept in sight for 48 hours: at %s', (now, expected) => {
  expect(seen([suctioned('11:00', 'fresh'), suctioned('12:00', 'none')], now)).toEqual(expected)
})

test('it says what to do, the day of the bleed and when it was charted', () => {
  const context = aContext([first, suctioned('11:00', 'fresh'), suctioned('12:00', 'none')], '2026-03-11 10:00')
  expect(bleedWatch(context)[0]).toMatchObject({
    action: 'Make sure that a doctor has seen this bleed, and keep watching for another.',
    cause:
      'Fresh blood on day 8 after the opening was made; until day 42 a bleed may warn of a larger one. Charted 10-Mar-2026 11:00.',
  })
})

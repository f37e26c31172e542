import { expect, test } from 'vitest'
import { clearedBlock } from '#app/care/adverse-event/examples.ts'
import { adverseEvent } from '#app/care/adverse-event/kind.ts'
import { cuffPressure } from '#app/care/cuff-pressure/kind.ts'
import { cuffStateKind } from '#app/care/cuff-state/kind.ts'
import { cuffStates } from '#app/care/cuff-state/schema.ts'
import type { StoredEntry } from '#app/care/kind.ts'
import { type AboutContext, aContext, anEntry, aTube } from '#app/care/make.ts'
import { calm } from '#app/care/observations/examples.ts'
import { observations } from '#app/care/observations/kind.ts'
import { secretionGrade } from '#app/care/secretion-grade/kind.ts'
import { usualCheck } from '#app/care/stoma-and-skin/examples.ts'
import { stomaAndSkin } from '#app/care/stoma-and-skin/kind.ts'
import { plainSuction } from '#app/care/suction/examples.ts'
import { suction } from '#app/care/suction/kind.ts'
import { tubeChange } from '#app/care/tube-change/kind.ts'
import { routinePlan } from '#app/care/tube-change-plan/examples.ts'
import { tubeChangePlan } from '#app/care/tube-change-plan/kind.ts'
import { contraindications, type TubePlanData } from '#app/care/tube-change-plan/schema.ts'
import { weaningPlan } from '#app/care/weaning-plan/kind.ts'
import type { WeaningPlanData } from '#app/care/weaning-plan/schema.ts'
import { valveStart } from '#app/care/weaning-trial/examples.ts'
import { weaningTrial } from '#app/care/weaning-trial/kind.ts'
import { weaningTrials } from '#app/care/weaning-trial/schema.ts'
import { entryWarnings } from '#app/rules/warnings.ts'
import { expectFound, type Found, fresh, gauge, grade, PLAN, topUp, tube, withTube } from './found.ts'

/*
 * Every row of the clinical reference 5.2 (red, with its words): what was found is taken by the form and warned of at that level; what
 * is contraindicated is refused as a plan. Sources of the rules stand in the reference; the words are its suggestions.
 */

const BREATHE = `Call for help now. Give oxygen to the face and the stoma. Take off any valve or cap, remove the inner cannula, then try a suction catheter. ${PLAN}`
const LARYNGECTOMY = `Call for help now. Give oxygen to the stoma. The mouth does not connect to the lungs. ${PLAN}`
const BLEED = `Call for help now and stay with the patient. Leave the tube in; if it has a cuff, keep it up. Treat this as a warning bleed. ${PLAN}`
const VALVE = `Take the valve off now. The patient may not be able to breathe out. Check the patient, then call for help. ${PLAN}`
const FOAM = `Take the valve off now. This cuff cannot be fully emptied. Call the tracheostomy team. ${PLAN}`
const POSITION = `Check the tube position now. The tube or cuff may have moved or failed. Call for help. ${PLAN}`
const OUT = `Call for help now. Oxygen to face and stoma. Do not push the tube back blindly. ${PLAN}`
const SWELLING = `Stop any bagging through the tube. Oxygen to face. Call for help now. ${PLAN}`
const foam = withTube({ cuff: 'foam' })
const toppedUp = [topUp('06:00'), topUp('09:00')]
const valveOn = anEntry(weaningTrials, '11:00', valveStart)
const spo2 = (spo2Low: number, spo2High: number): AboutContext => ({ patient: { spo2Low, spo2High } })
const laryngectomy: AboutContext = { patient: { upperAirway: 'not open' } }

const found: readonly Found[] = [
  // 5.2: breathing
  ['distress', observations, { ...calm, effort: 'distress' }, 'red', BREATHE],
  ['apnoea', observations, { ...calm, respiratoryRate: 0, effort: 'none' }, 'red', BREATHE],
  ['distress at suction', suction, { ...plainSuction, tolerance: 'distress' }, 'red', BREATHE],
  ['catheter will not pass', suction, { ...plainSuction, passed: 'no' }, 'red', BREATHE],
  ['SpO2 91, target 94 to 98', observations, { ...calm, spo2: 91 }, 'red', BREATHE, [tube], spo2(94, 98)],
  ['SpO2 83, target 88 to 92', observations, { ...calm, spo2: 83 }, 'red', BREATHE, [tube], spo2(88, 92)],
  ['SpO2 3 below target', observations, { ...calm, spo2: 85 }, 'red', BREATHE, [tube], spo2(88, 92)],
  ['SpO2 91 after suction', suction, { ...plainSuction, spo2After: 91 }, 'red', BREATHE, [tube], spo2(94, 98)],
  ['SpO2 83 after suction', suction, { ...plainSuction, spo2After: 83 }, 'red', BREATHE, [tube], spo2(88, 92)],
  [
    'the same after laryngectomy',
    observations,
    { ...calm, effort: 'distress' },
    'red',
    LARYNGECTOMY,
    [tube],
    laryngectomy,
  ],
  // 5.2: bleeding
  ['fresh blood at suction', suction, { ...plainSuction, blood: 'fresh' }, 'red', BLEED],
  ['heavy bleeding at suction', suction, { ...plainSuction, blood: 'heavy' }, 'red', BLEED],
  [
    'fresh ooze at the opening',
    stomaAndSkin,
    { ...usualCheck, appearance: ['crusting'], bleeding: 'fresh ooze' },
    'red',
    BLEED,
  ],
  ['fresh blood as a red flag', observations, { ...calm, redFlags: ['blood'] }, 'red', BLEED],
  ['a tube that moves with the pulse', observations, { ...calm, redFlags: ['pulse'] }, 'red', BLEED],
  ['fresh blood at a grading', secretionGrade, { ...grade, flags: ['fresh'] }, 'red', BLEED],
  ['a bleed as an event', adverseEvent, { ...clearedBlock, event: 'bleeding' }, 'red', BLEED],
  [
    'streaks only',
    suction,
    { ...plainSuction, blood: 'streaks' },
    'amber',
    'Ask a doctor to see the patient this shift.',
  ],
  [
    'streaks where the policy raises them',
    suction,
    { ...plainSuction, blood: 'streaks' },
    'red',
    BLEED,
    [fresh],
    { policy: { 'bleed-streaks-red': true } },
  ],
  // 5.2: valve or cap
  ['valve started with the cuff up', weaningTrial, { ...valveStart, cuffNow: 'up' }, 'red', VALVE],
  ['valve found with the cuff up', weaningTrial, { step: 'found', trial: 'valve', cuffNow: 'up' }, 'red', VALVE],
  ['valve seen, cuff charted as up', observations, { ...calm, onTube: 'valve' }, 'red', VALVE],
  ['cap seen, cuff charted as up', observations, { ...calm, onTube: 'cap' }, 'red', VALVE.replace('valve', 'cap')],
  ['cuff inflated under a valve', cuffStateKind, { act: 'seen up', leak: 'no' }, 'red', VALVE, [tube, valveOn]],
  ['the same as an event', adverseEvent, { ...clearedBlock, event: 'valve with cuff up' }, 'red', VALVE],
  [
    'valve seen, water cuff up',
    observations,
    { ...calm, onTube: 'valve' },
    'red',
    VALVE,
    [withTube({ cuff: 'water' })],
  ],
  [
    'cap found on a foam cuff',
    weaningTrial,
    { step: 'found', trial: 'cap', cuffNow: 'foam' },
    'red',
    FOAM.replace('valve', 'cap'),
  ],
  ['valve on a foam cuff', weaningTrial, { ...valveStart, cuffNow: 'foam' }, 'red', FOAM],
  ['valve started, tube has a foam cuff', weaningTrial, valveStart, 'red', FOAM, [foam]],
  ['valve seen on a foam cuff', observations, { ...calm, onTube: 'valve' }, 'red', FOAM, [foam]],
  ['the same as an event', adverseEvent, { ...clearedBlock, event: 'valve with cuff up' }, 'red', FOAM, [foam]],
  [
    'valve after laryngectomy',
    weaningTrial,
    valveStart,
    'red',
    `Take the valve off now. The mouth does not connect to the lungs. Check the patient, then call for help. ${PLAN}`,
    [tube],
    laryngectomy,
  ],
  // 5.2: position
  ['leak with repeated air', cuffPressure, { ...gauge, found: 24, leak: 'yes' }, 'red', POSITION, [tube, ...toppedUp]],
  ['voice with repeated air', observations, { ...calm, redFlags: ['voice'] }, 'red', POSITION, [tube, ...toppedUp]],
  ['tube moved', observations, { ...calm, redFlags: ['moved'] }, 'red', POSITION],
  [
    'tube out, day 3',
    adverseEvent,
    { ...clearedBlock, event: 'unplanned removal', tubeNow: 'out' },
    'red',
    OUT,
    [fresh],
  ],
  ['tube displaced, day 3', tubeChange, aTube({ reason: 'displaced' }), 'red', OUT, [fresh]],
  ['surgical emphysema', stomaAndSkin, { ...usualCheck, appearance: ['surgical emphysema'] }, 'red', SWELLING],
  ['new neck swelling', observations, { ...calm, redFlags: ['swelling'] }, 'red', SWELLING],
]
test.each(found.map(row => [row[0], row] as const))('found: %s (%#)', (_, row) => {
  expectFound(row)
})

test('a valve on with the cuff down, or on a tube without one, is no finding', () => {
  const down = anEntry(cuffStates, '11:00', {
    act: 'down',
    why: 'voice',
    agreedBy: 'Team',
    suctionFirst: 'both',
    tolerance: 'well',
  })
  const seen = { ...calm, onTube: 'valve' }
  for (const record of [[tube, down], [withTube({ cuff: 'none' })]]) {
    expect(entryWarnings(observations, seen, aContext(record, '12:00'))).toEqual([])
  }
})

const planned = { plannedOn: '2026-03-11', cuffThen: 'down', agreedWith: 'Team' } as const
const senior = { seniorName: 'Dr N. Abara', seniorReason: 'Seen by scope' }
const known = { settings: [], tasks: [] }

// Never, whoever decides: the same pairs as found above, and removal with the cuff up.
test.each<[string, Partial<WeaningPlanData>, readonly StoredEntry[], AboutContext?]>([
  ['valve, cuff up then', { step: 'valve', cuffThen: 'up' }, [tube]],
  ['cap, cuff up then', { step: 'cap', cuffThen: 'up' }, [tube]],
  ['valve, a cuff that is not there', { step: 'valve', cuffThen: 'none' }, [tube]],
  ['valve, foam cuff', { step: 'valve' }, [foam]],
  ['cap, foam cuff', { step: 'cap' }, [foam]],
  ['valve after laryngectomy', { step: 'valve' }, [tube], laryngectomy],
  ['cap after laryngectomy', { step: 'cap' }, [tube], laryngectomy],
  ['removal after laryngectomy', { step: 'removal' }, [tube], laryngectomy],
  ['removal, cuff up now', { step: 'removal' }, [tube]],
  ['cap today, valve on', { step: 'cap', plannedOn: '2026-03-10' }, [tube, valveOn]],
])('refused as a plan, a senior or not: %s', (_, plan, record, about = {}) => {
  const data = { ...planned, ...senior, ...plan } as WeaningPlanData
  expect(weaningPlan.schema.safeParse(data).success).toBe(true)
  expect(weaningPlan.problems?.(data, aContext(record, '12:00', about), known).length).toBeGreaterThan(0)
})

// Royal Marsden Manual, ch. 12: what speaks against a change of tube; a senior may decide for it, by name and with a reason.
test.each(Object.keys(contraindications).filter(one => one !== 'none'))(
  'a tube change is not planned with: %s',
  one => {
    const plan = { ...routinePlan, plannedOn: '2026-03-11', contraindications: [one] } as TubePlanData
    const problems = (data: TubePlanData) => tubeChangePlan.problems?.(data, aContext([tube], '12:00'), known)
    expect(problems(plan)).toMatchObject([{ field: 'contraindications' }])
    expect(problems({ ...plan, senior: 'Dr N. Abara', seniorReason: 'Cuff torn' })).toEqual([])
  },
)

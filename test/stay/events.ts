import { afterRemoval } from '#app/care/after-removal/kind.ts'
import { coughStrength } from '#app/care/cough-strength/kind.ts'
import { decannulation } from '#app/care/decannulation/kind.ts'
import { decannulationReadiness } from '#app/care/decannulation-readiness/kind.ts'
import { deferral } from '#app/care/deferral/kind.ts'
import { suction } from '#app/care/suction/kind.ts'
import { tubeChange } from '#app/care/tube-change/kind.ts'
import { tubeChangePlan } from '#app/care/tube-change-plan/kind.ts'
import { warningAnswer } from '#app/care/warning-answer/kind.ts'
import { weaningPlan } from '#app/care/weaning-plan/kind.ts'
import { type Act, act, calm, cuffTrial, cuffTrialEnd, like, pressure, skinSeen } from './acts.ts'

/** The three tubes, each smaller than the one before: with sutures; labelled for 14 days; without a cuff. */
export const firstTube = act(tubeChange, {
  ...{ reason: 'first insertion', technique: 'percutaneous', sutures: 'in place', longestUseDays: 29 },
  ...{ line: 'Corvane Dual', sizeSystem: 'ISO 5366', size: '8.0', construction: 'dual', innerCannula: 'disposable' },
  ...{ idWithInner: 8, idWithoutInner: 9, od: 11.3, lengthMm: 78, cuff: 'air', fenestrated: 'no', connector: 'outer' },
  ...{ flange: 'fixed', operator: 'Dr N. Abara', helper: 'R. Osei', difficulty: 'easy', position: 'capnography' },
})
export const secondTube = like(firstTube, {
  ...{ reason: 'first change', technique: undefined, sutures: 'none', longestUseDays: 14 },
  ...{ size: '7.5', innerCannula: 'reusable', idWithInner: 7.5, idWithoutInner: 8.5, od: 10.8 },
})
export const thirdTube = like(secondTube, {
  ...{ reason: 'smaller', longestUseDays: undefined },
  ...{ size: '7.0', idWithInner: 7, idWithoutInner: 8, od: 10.2, cuff: 'none' },
})

/** What goes wrong, and what is done about it. */
const episode = act(suction, {
  ...{
    act: 'episode',
    indication: ['secretions'],
    route: 'tube open',
    catheter: '12 Fr',
    vacuum: 120,
    vacuumUnit: 'mmHg',
  },
  ...{ passes: 2, passed: 'easily', amount: 'moderate', colour: 'clear', consistency: 'moderate', blood: 'none' },
  tolerance: 'well',
})
export const wouldNotPass = like(episode, { passed: 'no', amount: 'none', colour: undefined, consistency: undefined })
export const passedAgain = episode
export const toppedUp = (found: number, airMl: number, leak: 'yes' | 'no'): Act =>
  like(pressure, { found, leftAt: 24, airMl, leak })
export const noLeak = like(pressure, { leak: 'no' })
export const suturesOut = like(skinSeen, {
  sutures: 'removed now',
  sites: ['flange left', 'flange right', 'flange top', 'flange bottom', 'back of neck', 'under sutures'],
})
export const dressingDeferred = act(deferral, {
  ...{ task: 'dressing-change', minutes: '240', reason: 'procedure', agreedWith: 'Dr A. Haddad' },
})

/** Answers to a warning. */
export const seen = (warning: string): Act => act(warningAnswer, { warning, answer: 'seen' })
export const actedOn = (warning: string, done: string): Act => act(warningAnswer, { warning, answer: 'acted on', done })
export const settled = (warning: string, why: string): Act => act(warningAnswer, { warning, answer: 'settled', why })

/** Breathing 28 times a minute, from 18 before the trial: half as often again is 27. */
export const fast = like(calm, { respiratoryRate: 28, spo2: 95, heartRate: 90 })
export const stoppedForRate = like(cuffTrialEnd, { cuffNow: 'up', reasons: ['rate'] })
export const valveTrial = like(cuffTrial, { trial: 'valve' })
export const valveTrialEnd = like(cuffTrialEnd, { trial: 'valve' })
export const capTrial = like(cuffTrial, { trial: 'cap', cuffNow: 'none' })
export const capTrialEnd = like(cuffTrialEnd, { trial: 'cap', cuffNow: 'none' })

/** Steps that the team plans, on a day written as a date. */
export const planned = (
  step: 'cuff' | 'valve' | 'cap' | 'removal',
  plannedOn: string,
  cuffThen: 'down' | 'none' | 'up',
) => act(weaningPlan, { step, plannedOn, cuffThen, agreedWith: 'Tracheostomy team' })
export const changePlanned = (plannedOn: string): Act =>
  act(tubeChangePlan, {
    ...{
      step: 'plan',
      plannedOn,
      indication: 'smaller',
      newTube: 'Corvane Dual 7.0, no cuff',
      contraindications: ['none'],
    },
    ...{ operator: 'E. Solberg', helper: 'R. Osei', equipment: 'yes', spareSame: 'yes', spareSmaller: 'yes' },
    ...{
      fasted: 'arranged',
      capnography: 'yes',
      consent: 'given',
      ifItFails: 'Oxygen to face and stoma; the 7.5 again',
    },
  })

/** The end of the tube. */
export const strongCough = act(coughStrength, { route: 'mouth', peakFlow: 280, assisted: 'no' })
export const ready = act(decannulationReadiness, {
  ...{ cause: 'yes', airway: 'yes', commands: 'yes', cuffDown: 'yes', secretions: 'yes', cough: 'yes', swallow: 'yes' },
  ...{ heart: 'yes', chest: 'yes', team: 'yes' },
})
export const removed = act(decannulation, {
  ...{ agreed: 'yes', operator: 'E. Solberg', helper: 'R. Osei', kit: 'complete' },
  ...{ breathing: 'comfortable', dressing: 'yes' },
})
export const wellAfter = act(afterRemoval, {
  ...{ respiratoryRate: 16, spo2: 96, effort: 'easy', stridor: 'no', voice: 'clear' },
  ...{ monitored: 'yes', spareThere: 'yes' },
})
const opening = { sites: ['around opening'], ties: 'no ties' }
export const openingCloses = like(skinSeen, { ...opening, dressing: 'changed', secondPerson: 'alone' })
export const openingClosed = like(skinSeen, { ...opening, appearance: ['closed'], dressing: 'none' })

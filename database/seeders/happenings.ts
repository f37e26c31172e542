import { type AdverseEventData, adverseEvents } from '#app/care/adverse-event/schema.ts'
import { type KitData, kitChecks } from '#app/care/bedside-kit/schema.ts'
import { carePlans } from '#app/care/care-plan/schema.ts'
import { cuffChecks } from '#app/care/cuff-pressure/schema.ts'
import { type DeferralData, deferrals } from '#app/care/deferral/schema.ts'
import { freeNotes } from '#app/care/free-note/schema.ts'
import { innerCannulaActs } from '#app/care/inner-cannula/schema.ts'
import { observationSets } from '#app/care/observations/schema.ts'
import type { StomaData } from '#app/care/stoma-and-skin/schema.ts'
import { suctions } from '#app/care/suction/schema.ts'
import { type TubePlanData, tubePlans } from '#app/care/tube-change-plan/schema.ts'
import { addDays, localDay } from '#app/time/zone.ts'
import { type Bedside, hoursBefore, placeAt, tubeAt } from './bedside.ts'
import { foundBy } from './chart-cuff.ts'
import { wholeKit } from './chart-kit.ts'
import { calmSet } from './chart-observations.ts'
import { checkAt } from './chart-stoma.ts'
import { episode } from './chart-suction.ts'
import { draft } from './draft.ts'
import { idAt } from './random.ts'
import type { Happening } from './story.ts'

/** The inner cannula was found half blocked and replaced: it is looked at again within hours. */
export function heavyCoating(hoursAgo: number): Happening {
  return bedside => {
    const { at, tube } = momentOf(bedside, hoursAgo)
    const act = tube.innerCannula === 'reusable' ? 'swapped' : 'replaced'
    const fit = { line: tube.line, size: tube.size, locked: 'yes', spare: 'yes' } as const
    const note = 'Thick plug. Nebuliser asked for.'
    return [draft(innerCannulaActs, at, { act, condition: 'heavy', ...fit, tolerance: 'cough', note })]
  }
}

/** A look after which no matching spare was left at the bedside. */
export function withoutSpare(hoursAgo: number): Happening {
  return bedside => {
    const { at, tube } = momentOf(bedside, hoursAgo)
    const fit = { line: tube.line, size: tube.size, locked: 'yes', spare: 'no' } as const
    const note = 'Last one used. Stores asked for more.'
    return [draft(innerCannulaActs, at, { act: 'replaced', condition: 'light', ...fit, tolerance: 'well', note })]
  }
}

/** The other one of a reusable pair went to be cleaned and is not back. */
export function pairInCleaning(hoursAgo: number): Happening {
  return bedside => {
    const { at } = momentOf(bedside, hoursAgo)
    const note = 'In the cleaning room. No other one of this size on the ward.'
    return [draft(innerCannulaActs, at, { act: 'other only', other: 'cleaning', spare: 'no', note })]
  }
}

/** A change of the tube planned through its gate, so many days from the end of the story. */
export function changePlanned(hoursAgo: number, inDays: number, more: Partial<TubePlanData> = {}): Happening {
  return bedside => {
    const { at, tube } = momentOf(bedside, hoursAgo)
    const { ward, bed } = placeAt(bedside, at)
    const plan: TubePlanData = {
      step: 'plan',
      plannedOn: addDays(localDay(bedside.now, bedside.zone), inDays),
      indication: 'routine',
      newTube: `${tube.line} ${tube.size}`,
      contraindications: ['none'],
      operator: bedside.rota.lead(ward, 'tracheostomy specialist').name,
      helper: bedside.rota.nurse(ward, bed, at).name,
      equipment: 'yes',
      spareSame: 'yes',
      spareSmaller: 'yes',
      fasted: 'arranged',
      capnography: 'yes',
      consent: 'given',
      ifItFails: 'Oxygen to face and stoma, airway team called, then the tube one size smaller over a guide',
      ...more,
    }
    return [draft(tubePlans, at, plan, { by: 'tracheostomy specialist' })]
  }
}

/** Something was missing at a check of the bedside kit, and has not come yet. */
export function kitIncomplete(hoursAgo: number, lacks: Required<Pick<KitData, 'missing' | 'owner'>>): Happening {
  return bedside => {
    const { at, tube } = momentOf(bedside, hoursAgo)
    return [draft(kitChecks, at, { ...wholeKit(bedside, tube), complete: 'no', ...lacks, expectedMin: 20 })]
  }
}

/** The pressure was found high and left above the band: it is measured again within the half hour. */
export function cuffLeftHigh(hoursAgo: number): Happening {
  return bedside => {
    const at = hoursBefore(bedside.now, hoursAgo)
    const { upper } = bedside.band
    const more = { position: 'side', reason: 'turned', airMl: -0.5 } as const
    return [draft(cuffChecks, at, foundBy(bedside, at, upper + 8, more, upper + 4))]
  }
}

/** Copious secretions: the need is looked at again sooner. */
export function copiousSecretions(hoursAgo: number): Happening {
  return bedside => {
    const { at, tube } = momentOf(bedside, hoursAgo)
    const seen = { amount: 'copious', colour: 'yellow', consistency: 'thick', passes: 3 } as const
    return [draft(suctions, at, episode(bedside, tube, seen))]
  }
}

/** Streaks of blood at suction: a doctor is asked. */
export function streaksOfBlood(hoursAgo: number): Happening {
  return bedside => {
    const { at, tube } = momentOf(bedside, hoursAgo)
    const note = 'Doctor told, will come this shift.'
    return [draft(suctions, at, episode(bedside, tube, { blood: 'streaks', note }))]
  }
}

/** The tube blocked and was cleared: an event that was put right. */
export function blockCleared(hoursAgo: number): Happening {
  return bedside => {
    const { at } = momentOf(bedside, hoursAgo)
    const data: AdverseEventData = {
      event: 'blocked',
      done: ['help called', 'inner cannula out', 'suction', 'oxygen'],
      outcome: 'recovered',
      told: ['charge nurse', 'doctor', 'specialist'],
      note: 'Thick plug in the inner cannula. Catheter passed once it was out.',
    }
    return [draft(adverseEvents, at, data, { writtenAfter: 25 })]
  }
}

/** A few words for those who come after. */
export function noted(hoursAgo: number, words: string): Happening {
  return bedside => [draft(freeNotes, hoursBefore(bedside.now, hoursAgo), { words })]
}

/** Breathing faster and harder than usual: a doctor is asked. */
export function hardBreathing(hoursAgo: number): Happening {
  return bedside => {
    const { at } = momentOf(bedside, hoursAgo)
    const seen = { respiratoryRate: 26, effort: 'increased', heartRate: 108, note: 'Suctioned. Doctor asked.' } as const
    return [draft(observationSets, at, { ...calmSet(bedside), ...seen })]
  }
}

/** SpO2 as it fell and came back, counted back from the moment of seeding. */
export function lowSaturation(seen: readonly (readonly [hoursAgo: number, spo2: number])[]): Happening {
  return bedside =>
    seen.map(([hoursAgo, spo2]) =>
      draft(observationSets, hoursBefore(bedside.now, hoursAgo), { ...calmSet(bedside), spo2 }, { writtenAfter: 12 }),
    )
}

/** Two digits swapped at charting, and put right a quarter of an hour later by the same nurse. */
export function digitsSwapped(hoursAgo: number): Happening {
  return bedside => {
    const at = hoursBefore(bedside.now, hoursAgo)
    const right = foundBy(bedside, at, bedside.band.lower + 4, { position: 'head up' })
    const found = Number([...String(right.found)].reverse().join(''))
    const wrong = draft(cuffChecks, at, { ...right, found }, { writtenAfter: 2 })
    return [
      wrong,
      draft(cuffChecks, at, right, { supersedes: wrong, reason: 'Digits swapped at charting', writtenAfter: 16 }),
    ]
  }
}

/** Charted for the wrong patient and taken back. */
export function wrongPatient(hoursAgo: number): Happening {
  return bedside => {
    const { at, tube } = momentOf(bedside, hoursAgo)
    const wrong = draft(suctions, at, episode(bedside, tube), { writtenAfter: 3 })
    const reason = 'Belongs to the patient in the next bed'
    return [wrong, { ...wrong, supersedes: wrong, reason, status: 'retracted', writtenAfter: 27 }]
  }
}

/** A look at the need for suction that was written down much later. */
export function writtenLate(hoursAgo: number, writtenAfterHours: number, reason?: string): Happening {
  return bedside => {
    const at = hoursBefore(bedside.now, hoursAgo)
    const more = { writtenAfter: writtenAfterHours * 60, ...(reason === undefined ? {} : { reason }) }
    return [draft(suctions, at, { act: 'need only' }, more)]
  }
}

/** Due care put off for a while, as agreed with the charge nurse. */
export function putOff(
  hoursAgo: number,
  { task, minutes, reason }: Pick<DeferralData, 'task' | 'minutes' | 'reason'>,
): Happening {
  return bedside => {
    const at = hoursBefore(bedside.now, hoursAgo)
    const agreedWith = bedside.rota.lead(placeAt(bedside, at).ward, 'charge nurse').name
    return [draft(deferrals, at, { task, minutes, reason, agreedWith })]
  }
}

/** An own value in place of the ward's. */
export function ownValue(
  hoursAgo: number,
  plan: { setting: string; value: number; reason: string; reviewInDays: number },
): Happening {
  return bedside => {
    const { setting, value, reason, reviewInDays } = plan
    const reviewOn = addDays(localDay(bedside.now, bedside.zone), reviewInDays)
    const at = hoursBefore(bedside.now, hoursAgo)
    const data = { setting, step: 'set own value', value, reviewOn, reason } as const
    return [draft(carePlans, at, data, { by: 'tracheostomy specialist' })]
  }
}

/** A look at an opening from which the tube was taken out for good. */
export function closingOpening(hoursAgo: number, note: string): Happening {
  return bedside => {
    const more = { dressing: 'left in place', sites: ['around opening'], note } as const
    return [checkAt(bedside, hoursBefore(bedside.now, hoursAgo), false, { ...more, sites: [...more.sites] })]
  }
}

/** A look with photographs of what it found. */
export function photographed(hoursAgo: number, count: number, more: Partial<StomaData> = {}): Happening {
  return bedside => {
    const at = hoursBefore(bedside.now, hoursAgo)
    const photographs = Array.from({ length: count }, () => idAt(at, bedside.random))
    return [checkAt(bedside, at, false, { ...more, photographs })]
  }
}

/** The tube in place at the moment of a happening. Throws RangeError when the story has none there. */
function momentOf(bedside: Bedside, hoursAgo: number) {
  const at = hoursBefore(bedside.now, hoursAgo)
  const period = tubeAt(bedside, at)
  if (!period) throw new RangeError(`${bedside.story.bed} has no tube ${hoursAgo} h before the end`)
  return { at, tube: period.tube }
}

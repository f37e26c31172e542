import { coughChecks } from '#app/care/cough-strength/schema.ts'
import { cuffStates } from '#app/care/cuff-state/schema.ts'
import { readinessChecks } from '#app/care/decannulation-readiness/schema.ts'
import { observationSets } from '#app/care/observations/schema.ts'
import { type SecretionGradeData, secretionGrades } from '#app/care/secretion-grade/schema.ts'
import { suctions } from '#app/care/suction/schema.ts'
import { transfers } from '#app/care/transfer-checklist/schema.ts'
import { weaningPlans } from '#app/care/weaning-plan/schema.ts'
import { type WeaningTrialData, weaningTrials } from '#app/care/weaning-trial/schema.ts'
import { addDays, localDay } from '#app/time/zone.ts'
import { hoursBefore, tubeAt } from './bedside.ts'
import { calmSet } from './chart-observations.ts'
import { episode } from './chart-suction.ts'
import { type Draft, draft } from './draft.ts'
import type { Happening } from './story.ts'

const therapist = { by: 'respiratory therapist' } as const
const before = { respiratoryRate: 16, spo2: 96, heartRate: 80 } as const

type Borne = Partial<Pick<WeaningTrialData, 'reasons' | 'afterwards'>> & {
  /** The cuff during it, and as it is left. */
  readonly cuff?: readonly [WeaningTrialData['cuffNow'], WeaningTrialData['cuffNow']]
}

/** A trial from one moment to another: as planned on a tube without a cuff, unless it is said otherwise. */
export function trialFrom(
  trial: WeaningTrialData['trial'],
  [from, to]: readonly [Date, Date],
  { cuff = ['none', 'none'], reasons = ['planned'], afterwards = 'settled' }: Borne = {},
): readonly Draft[] {
  const ready = { airflow: 'yes', suctionFirst: 'yes', supervised: 'yes' } as const
  return [
    draft(weaningTrials, from, { step: 'start', trial, cuffNow: cuff[0], ...ready, ...before }, therapist),
    draft(weaningTrials, to, { step: 'end', trial, cuffNow: cuff[1], reasons, afterwards }, therapist),
  ]
}

/** A trial that was borne as long as it is said, counted back from the moment of seeding. */
export function trialBorne(
  trial: WeaningTrialData['trial'],
  [fromHoursAgo, toHoursAgo]: readonly [number, number],
  how: Borne = {},
): Happening {
  return ({ now }) => trialFrom(trial, [hoursBefore(now, fromHoursAgo), hoursBefore(now, toHoursAgo)], how)
}

/** The cuff let down for a trial, with suction first. */
export function cuffLetDown(hoursAgo: number): Happening {
  return bedside => {
    const at = hoursBefore(bedside.now, hoursAgo)
    const period = tubeAt(bedside, at)
    if (!period) throw new RangeError(`${bedside.story.bed} has no tube ${hoursAgo} h before the end`)
    const suctioned = episode(bedside, period.tube, { indication: ['cuff down'], amount: 'small' })
    const agreedBy = bedside.rota.lead(bedside.place.ward, 'tracheostomy specialist').name
    const data = { act: 'down', why: 'trial', agreedBy, suctionFirst: 'both', volumeMl: 6, tolerance: 'well' } as const
    return [
      draft(suctions, hoursBefore(at, 0.1), suctioned, therapist),
      draft(cuffStates, at, data, { ...therapist, writtenAfter: 3 }),
    ]
  }
}

/** A valve trial that runs, with the sets of observations that are due in it. */
export function valveRunning(hoursAgo: number, setsHoursAgo: readonly number[]): Happening {
  return bedside => {
    const start = { step: 'start', trial: 'valve', cuffNow: 'down', airflow: 'yes' } as const
    const ready = { suctionFirst: 'yes', supervised: 'yes', ...before } as const
    const seen = { respiratoryRate: 18, spo2: 96, heartRate: 84, onTube: 'valve' } as const
    return [
      draft(
        weaningTrials,
        hoursBefore(bedside.now, hoursAgo),
        { ...start, ...ready },
        { ...therapist, writtenAfter: 2 },
      ),
      ...setsHoursAgo.map(ago =>
        draft(observationSets, hoursBefore(bedside.now, ago), { ...calmSet(bedside), ...seen }, { writtenAfter: 1 }),
      ),
    ]
  }
}

/** Readiness for removal, part of it still to be assessed. */
export function readyInPart(hoursAgo: number): Happening {
  return ({ now }) => [
    draft(
      readinessChecks,
      hoursBefore(now, hoursAgo),
      {
        cause: 'yes',
        airway: 'not assessed',
        whyNotAirway: 'Scope booked for tomorrow morning',
        commands: 'yes',
        cuffDown: 'yes',
        secretions: 'yes',
        cough: 'yes',
        swallow: 'not assessed',
        whyNotSwallow: 'Speech-language therapist comes this afternoon',
        heart: 'yes',
        chest: 'yes',
        team: 'no',
      },
      { by: 'tracheostomy specialist' },
    ),
  ]
}

/** A step planned by the team, some days ahead. */
export function trialPlanned(hoursAgo: number, step: 'cuff' | 'valve' | 'cap', inDays: number): Happening {
  return ({ now, zone, rota, place }) => {
    const agreedWith = rota.lead(place.ward, 'tracheostomy specialist').name
    const plannedOn = addDays(localDay(now, zone), inDays)
    const data = { step, plannedOn, cuffThen: step === 'cuff' ? 'down' : 'none', agreedWith } as const
    return [draft(weaningPlans, hoursBefore(now, hoursAgo), data, { by: 'tracheostomy specialist' })]
  }
}

/** Secretions by grades at several moments, counted back from that of seeding. */
export function gradedOver(seen: readonly (readonly [number, Partial<SecretionGradeData>])[]): Happening {
  return bedside => seen.flatMap(([hoursAgo, grades]) => graded(hoursAgo, grades)(bedside))
}

/** Secretions by grades, and a cough that was measured through tube and valve. */
export function graded(hoursAgo: number, seen: Partial<SecretionGradeData>, peakFlow?: number): Happening {
  return ({ now }) => {
    const at = hoursBefore(now, hoursAgo)
    const grades = { cough: 'vigorous', passes: 'one', colour: 'clear', viscosity: 'frothy', interval: 'rare' } as const
    const flow = { grade: '4', route: 'valve', assisted: 'no' } as const
    return [
      draft(secretionGrades, at, { ...grades, flags: ['none'], ...seen }, therapist),
      ...(peakFlow === undefined ? [] : [draft(coughChecks, at, { ...flow, peakFlow }, therapist)]),
    ]
  }
}

/** A move to this ward with everything along. */
export function transferred(hoursAgo: number, place: string, handedTo: string): Happening {
  return ({ now }) => {
    const all = { place, complete: 'yes', handedTo } as const
    return [
      draft(transfers, hoursBefore(now, hoursAgo + 0.3), { moment: 'leaving', ...all }),
      draft(transfers, hoursBefore(now, hoursAgo - 0.1), { moment: 'arrived', ...all }),
    ]
  }
}

import { changeByDay } from '../../clinical/dwell.ts'
import type { Tract } from '../../clinical/tract.ts'
import { addDays, daysBetween, type LocalDay, localDay, startOfDay } from '../../time/zone.ts'
import type { CareContext, Entry, PatientRecord } from '../kind.ts'
import type { Setting } from '../policy.ts'
import { isThroughTube, suctions } from '../suction/schema.ts'
import { dwellDual, dwellSingle, dwellSingleHeavy, heavyEpisodes } from './dwell-settings.ts'
import { type TubeData, tubeChanges } from './schema.ts'
import { lastTube, tubeAbsence } from './tube-absence.ts'

export type { TubeData } from './schema.ts'
export type TubeEntry = Entry<TubeData>

/** The tube in place: the latest change that did not fail, unless the tube was taken out for good or came out after it. */
export function tubeInPlace(record: PatientRecord): TubeEntry | undefined {
  return tubeAbsence(record) ? undefined : lastTube(record)
}

/** Local day on which the tube in place went in: day 0 of its dwell. */
export function insertedOn(tube: TubeEntry, context: Pick<CareContext, 'ward'>): LocalDay {
  return tube.data.insertedOn ?? localDay(tube.performedAt, context.ward.zone)
}

/**
 * The moment the tube in place went in. Of one in place on arrival only the day is known: the end of that day, so that a new tube is
 * never taken for an old one.
 */
export function insertedAt(tube: TubeEntry, { ward }: Pick<CareContext, 'ward'>): Date {
  if (tube.data.insertedOn === undefined) return tube.performedAt
  const dayAfter = startOfDay(addDays(tube.data.insertedOn, 1), ward.zone)
  return new Date(Math.min(dayAfter.getTime(), tube.performedAt.getTime()))
}

export interface DwellLimit {
  readonly days: number
  /** Which limit is the strictest, in words. */
  readonly because: string
  readonly changeBy: LocalDay
}

/** The strictest of the device's label and the policy for its construction (domain ). */
export function dwellLimit(tube: TubeEntry, context: CareContext): DwellLimit {
  const setting = dwellSetting(tube, context)
  const policy = context.values.of(setting)
  const device = tube.data.longestUseDays
  const days = device !== undefined && device < policy ? device : policy
  const because =
    days === policy ? `${setting.label.toLowerCase()}: ${policy} days` : `longest use on the label: ${days} days`
  return { days, because, changeBy: changeByDay(insertedOn(tube, context), days) }
}

/** A single cannula clogs for good: heavy secretions shorten its limit, unless the care plan sets one for this patient. */
function dwellSetting(tube: TubeEntry, { record, values }: CareContext): Setting<number> {
  if (tube.data.construction === 'dual') return dwellDual
  if (values.personal(dwellSingle) || values.of(dwellSingleHeavy) >= values.of(dwellSingle)) return dwellSingle
  const copious = record
    .since(suctions, tube.performedAt)
    .filter(({ data }) => isThroughTube(data) && data.amount === 'copious')
  return copious.length >= values.of(heavyEpisodes) ? dwellSingleHeavy : dwellSingle
}

/** `8.0 ISO 5366`, `6 Jackson`: the size as printed, with its system. */
export function sizeWords(data: TubeData): string {
  return `${data.size} ${data.sizeSystem}`
}

const cuffWords = { none: 'uncuffed', air: 'cuffed', water: 'water cuff', foam: 'foam cuff' } as const

/** `8.0 ISO 5366, cuffed, dual`. */
export function tubeWords(data: TubeData): string {
  return `${sizeWords(data)}, ${cuffWords[data.cuff]}, ${data.construction}`
}

/** The inside diameter that a suction catheter meets: with the inner cannula in, where there is one. */
export function workingIdMm(
  data: Pick<TubeData, 'construction' | 'innerCannula' | 'idWithInner' | 'idWithoutInner'>,
): number {
  return data.construction === 'dual' && data.innerCannula !== 'none' && data.idWithInner !== undefined
    ? data.idWithInner
    : data.idWithoutInner
}

/** Whether this tube is the one that was put in when the opening was made. */
export function isFirstTube(tube: TubeEntry): boolean {
  const { reason, insertedOn: on, stomaMadeOn: made } = tube.data
  return reason === 'first insertion' || (reason === 'on arrival' && on !== undefined && on === made)
}

/** Age of the opening in days, when the record knows it. */
export function stomaAgeDays(context: CareContext): number | undefined {
  const madeOn = stomaMadeOn(context)
  return madeOn === undefined ? undefined : daysBetween(madeOn, localDay(context.now, context.ward.zone))
}

/** The day on which the opening was made: charted on arrival, or that of the first insertion. */
export function stomaMadeOn(context: CareContext): string | undefined {
  const opening = context.record.latest(
    tubeChanges,
    data => data.stomaMadeOn !== undefined || data.reason === 'first insertion',
  )
  return opening && (opening.data.stomaMadeOn ?? localDay(opening.performedAt, context.ward.zone))
}

/** What is known of the tract, for its state; undefined when the record does not know when the opening was made. */
export function tubeTract(context: CareContext): Tract | undefined {
  const madeOn = stomaMadeOn(context)
  if (madeOn === undefined) return undefined
  const { record, ward, now } = context
  const changes = record
    .of(tubeChanges)
    .filter(tube => !isFirstTube(tube))
    .map(tube => ({
      on: insertedOn(tube, context),
      // A tube already in place on arrival is not the first: a change went before, and nothing says that it went badly.
      uncomplicated: tube.data.difficulty !== 'difficult' && tube.data.difficulty !== 'failed',
    }))
  return { madeOn, changes, laryngectomy: record.patient.upperAirway === 'not open', today: localDay(now, ward.zone) }
}

import { cuffLower, cuffUpper } from '#app/care/cuff-pressure/settings.ts'
import { earlier, hours, later, minutes } from '#app/time/duration.ts'
import type { Zone } from '#app/time/zone.ts'
import type { Rota } from './people.ts'
import type { Random } from './random.ts'
import type { DemoBed } from './rows.ts'
import type { BedStory } from './story.ts'
import { type PrintedTube, printedTubes } from './tubes.ts'
import type { WardWithBeds } from './wards.ts'

/** A tube from the moment on at which it was put in. */
export interface TubePeriod {
  readonly from: Date
  readonly tube: PrintedTube
  readonly sutures: 'none' | 'in place'
  /** During the stay, so that its hour is known. */
  readonly putInHere: boolean
}

export interface Place {
  readonly ward: WardWithBeds
  readonly bed: DemoBed
}

/** One patient's stay as the charting sees it. */
export interface Bedside {
  readonly story: BedStory
  readonly now: Date
  readonly zone: Zone
  readonly random: Random
  readonly rota: Rota
  readonly place: Place
  /** Where the patient was before a move, and until when. */
  readonly earlierPlace: (Place & { readonly until: Date }) | undefined
  readonly admittedAt: Date
  /** Routine care of the tube ends here: its removal, or now. */
  readonly until: Date
  readonly tubes: readonly TubePeriod[]
  /** The band of cuff pressure of the ward, in cmH2O. */
  readonly band: { readonly lower: number; readonly upper: number }
}

/** The bedside of a story. */
export function bedsideOf(
  story: BedStory,
  known: Pick<Bedside, 'now' | 'zone' | 'random' | 'rota'> & { readonly placeOf: (bedLabel: string) => Place },
): Bedside {
  const { placeOf, ...at } = known
  const { now } = at
  const place = placeOf(story.bed)
  const { movedFrom } = story
  const admittedAt = hoursBefore(now, story.admittedHoursAgo)
  const until = story.removedHoursAgo === undefined ? now : hoursBefore(now, story.removedHoursAgo)
  return {
    ...at,
    story,
    place,
    earlierPlace: movedFrom && { ...placeOf(movedFrom.bed), until: hoursBefore(now, movedFrom.hoursAgo) },
    admittedAt,
    until,
    tubes: tubePeriods(story, now, admittedAt),
    band: { lower: cuffLower.default, upper: place.ward.cuffUpperLimit ?? cuffUpper.default },
  }
}

function tubePeriods({ tube, change }: BedStory, now: Date, admittedAt: Date): readonly TubePeriod[] {
  if (!tube) return []
  const putInHere = 'hoursAgo' in tube.inserted
  const from = 'hoursAgo' in tube.inserted ? hoursBefore(now, tube.inserted.hoursAgo) : later(admittedAt, minutes(20))
  const sutures = tube.sutures ? 'in place' : 'none'
  const first: TubePeriod = { from, tube: printedTubes[tube.name], sutures, putInHere }
  if (!change) return [first]
  const changedAt = hoursBefore(now, change.hoursAgo)
  return [first, { from: changedAt, tube: printedTubes[change.name], sutures: 'none', putInHere: true }]
}

/** The bed that the patient had at a moment. */
export function placeAt({ place, earlierPlace }: Bedside, at: Date): Place {
  return earlierPlace && at < earlierPlace.until ? earlierPlace : place
}

/** The tube that was in at a moment; undefined before the first one, after its removal for good, and where there is none. */
export function tubeAt({ story, tubes, until }: Bedside, at: Date): TubePeriod | undefined {
  const isRemoved = story.removedHoursAgo !== undefined && at > until
  return isRemoved ? undefined : tubes.findLast(period => period.from <= at)
}

/** A whole minute so many hours before a moment: acts are charted to the minute. */
export function hoursBefore(at: Date, count: number): Date {
  const ms = earlier(at, hours(count)).getTime()
  return new Date(ms - (ms % 60_000))
}

/**
 * When a routine act was done, latest first: the last time so that its clock stands `pastDue` hours past due at the end of the
 * routine, the times before about an interval apart, back to the first tube.
 */
export function pacedTimes(bedside: Bedside, { every, pastDue }: { every: number; pastDue: number }): readonly Date[] {
  const { until, admittedAt, random } = bedside
  const start = later(bedside.tubes[0]?.from ?? admittedAt, minutes(5))
  const times: Date[] = []
  for (
    let at = hoursBefore(until, every + pastDue);
    at > start;
    at = hoursBefore(at, every * random.between(0.88, 1.05))
  ) {
    times.push(at)
  }
  return times
}

/** How far past due a clock stands at a bed where nothing is late, in hours: some are just about due. */
export function inTime({ random }: Bedside, every: number): number {
  return -every * random.between(0.04, 0.85)
}

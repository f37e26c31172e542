import { cuffChecks } from '#app/care/cuff-pressure/schema.ts'
import { decannulations } from '#app/care/decannulation/schema.ts'
import { tubeChanges } from '#app/care/tube-change/schema.ts'
import { later, minutes } from '#app/time/duration.ts'
import { addDays, localDay } from '#app/time/zone.ts'
import type { Bedside, TubePeriod } from './bedside.ts'
import { settledReading } from './chart-cuff.ts'
import { type Draft, draft } from './draft.ts'
import type { FirstTube, TubeSwap } from './story.ts'
import { packOf } from './tubes.ts'

/** The tubes of a stay as they went in, each cuff checked after it, and the removal for good. */
export function tubeCare(bedside: Bedside): readonly Draft[] {
  const { story, tubes } = bedside
  const [first, second] = tubes
  return [
    ...(first && story.tube ? firstTube(bedside, first, story.tube) : []),
    ...(second && story.change ? changed(bedside, second, story.change) : []),
    ...removal(bedside),
  ]
}

function firstTube(bedside: Bedside, { from, tube, sutures }: TubePeriod, story: FirstTube): readonly Draft[] {
  const today = localDay(bedside.now, bedside.zone)
  const { inserted, technique } = story
  if ('hoursAgo' in inserted) {
    const operator = technique === 'surgical' ? 'Dr N. Abarinde' : 'Dr P. Silvennoinen'
    const how = { operator, helper: 'R. Oseitutu', difficulty: 'easy', position: 'capnography' } as const
    const data = { reason: 'first insertion', ...tube, technique, sutures, ...how } as const
    return [draft(tubeChanges, from, data), ...cuffAfter(bedside, from, tube)]
  }
  return [
    draft(tubeChanges, from, {
      reason: 'on arrival',
      insertedOn: addDays(today, -inserted.daysAgo),
      stomaMadeOn: addDays(today, -inserted.stomaDaysAgo),
      ...tube,
      technique,
      sutures,
      operator: 'Before this stay',
      difficulty: 'not known',
      position: 'airflow',
    }),
  ]
}

function changed(bedside: Bedside, { from, tube, sutures }: TubePeriod, { reason }: TubeSwap): readonly Draft[] {
  const specialist = bedside.rota.lead(bedside.place.ward, 'tracheostomy specialist')
  const helper = bedside.rota.nurse(bedside.place.ward, bedside.place.bed, from).name
  const data = { ...tube, ...packOf(tube, from), reason, sutures, operator: specialist.name, helper } as const
  return [
    draft(
      tubeChanges,
      from,
      { ...data, difficulty: 'easy', position: 'capnography', bleeding: 'none' },
      { by: 'tracheostomy specialist' },
    ),
    ...cuffAfter(bedside, from, tube),
  ]
}

function cuffAfter(bedside: Bedside, from: Date, tube: TubePeriod['tube']): readonly Draft[] {
  if (tube.cuff !== 'air') return []
  const data = { ...settledReading(bedside, from), reason: 'inflation', cuffNow: 'inflated' } as const
  return [draft(cuffChecks, later(from, minutes(6)), data)]
}

function removal({ story, until, place: { ward, bed }, rota }: Bedside): readonly Draft[] {
  if (story.removedHoursAgo === undefined) return []
  const people = {
    operator: rota.lead(ward, 'tracheostomy specialist').name,
    helper: rota.nurse(ward, bed, until).name,
  }
  return [
    draft(
      decannulations,
      until,
      { agreed: 'yes', ...people, kit: 'complete', breathing: 'comfortable', dressing: 'yes' },
      { by: 'tracheostomy specialist', witness: 'charge nurse' },
    ),
  ]
}

import { cuffUpper } from '#app/care/cuff-pressure/settings.ts'
import { inspectionInterval } from '#app/care/inner-cannula/settings.ts'
import { careSettings } from '#app/care/kinds.ts'
import { addDays, localDay, startOfDay, type Zone } from '#app/time/zone.ts'
import { idAt, randomFrom } from './random.ts'
import type { DemoPerson, DemoPolicy } from './rows.ts'
import type { WardWithBeds } from './wards.ts'

const REVIEWER = 'Dr Hedda Calloway-Mensah, clinical lead'
const IN_FORCE_FOR_DAYS = 40
const COMES_IN_DAYS = 3

/** The hospital's policy with every number at its default, and one for each ward that departs from it. */
export function demoPolicies(
  now: Date,
  zone: Zone,
  wards: readonly WardWithBeds[],
  author: DemoPerson,
): readonly DemoPolicy[] {
  const random = randomFrom(`policies ${now.getTime()}`)
  const startsOn = addDays(localDay(now, zone), -IN_FORCE_FOR_DAYS)
  const startsAt = startOfDay(startsOn, zone)
  const defaults = Object.fromEntries(careSettings.map(setting => [setting.name, setting.default]))
  const common = { version: 1, reviewedBy: REVIEWER, reviewedOn: addDays(startsOn, -3), startsAt, createdBy: author.id }
  const hospital: DemoPolicy = {
    ...common,
    id: idAt(startsAt, random),
    name: 'Tracheostomy care of adults',
    wardId: null,
    values: defaults,
    reason: 'First reviewed set: every number at its default',
  }
  return [hospital, ...wards.flatMap(own), ...wards.slice(0, 1).map(coming)]

  function own({ row, cuffUpperLimit }: WardWithBeds): readonly DemoPolicy[] {
    if (cuffUpperLimit === undefined) return []
    const about = { name: `Tracheostomy care, ${row.name}`, wardId: row.id }
    const values = { ...defaults, [cuffUpper.name]: cuffUpperLimit }
    const reason = `Cuff pressure at most ${cuffUpperLimit} cmH2O, as the ward has long kept it`
    return [{ ...common, id: idAt(startsAt, random), ...about, values, reason }]
  }

  /** The first ward takes a version of its own into use in a few days. */
  function coming({ row }: WardWithBeds): DemoPolicy {
    const start = startOfDay(addDays(localDay(now, zone), COMES_IN_DAYS), zone)
    return {
      ...hospital,
      ...{ id: idAt(now, random), name: `Tracheostomy care, ${row.name}`, wardId: row.id, startsAt: start },
      reviewedOn: addDays(localDay(now, zone), -1),
      values: { ...defaults, [inspectionInterval.name]: 6 },
      reason: 'Two blocked inner cannulas in October: inspected every 6 hours on this ward',
    }
  }
}

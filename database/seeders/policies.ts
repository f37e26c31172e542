import { cuffUpper } from '#app/care/cuff-pressure/settings.ts'
import { inspectionInterval } from '#app/care/inner-cannula/settings.ts'
import { careSettings } from '#app/care/kinds.ts'
import { addDays, type LocalDay, localDay, startOfDay, type Zone } from '#app/time/zone.ts'
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
  const first = {
    ...{ version: 1, reviewedBy: REVIEWER, reviewedOn: addDays(startsOn, -3), startsAt, createdBy: author.id },
    values: Object.fromEntries(careSettings.map(setting => [setting.name, setting.default])),
  }
  const hospital: DemoPolicy = {
    ...first,
    id: idAt(startsAt, random),
    name: 'Tracheostomy care of adults',
    wardId: null,
    reason: 'First reviewed set: every number at its default',
  }
  return [
    hospital,
    ...wards.flatMap(ward => ownOf(ward, first, idAt(startsAt, random))),
    ...wards
      .slice(0, 1)
      .map(ward => comingOf(ward, first, { id: idAt(now, random), today: localDay(now, zone), zone })),
  ]
}

type Reviewed = Omit<DemoPolicy, 'id' | 'name' | 'wardId' | 'reason'>

function ownOf({ row, cuffUpperLimit }: WardWithBeds, first: Reviewed, id: string): readonly DemoPolicy[] {
  if (cuffUpperLimit === undefined) return []
  const about = { id, name: `Tracheostomy care, ${row.name}`, wardId: row.id }
  const values = { ...first.values, [cuffUpper.name]: cuffUpperLimit }
  const reason = `Cuff pressure at most ${cuffUpperLimit} cmH2O, as the ward has long kept it`
  return [{ ...first, ...about, values, reason }]
}

/** The first ward takes a version of its own into use in a few days. */
function comingOf(
  { row }: WardWithBeds,
  first: Reviewed,
  { id, today, zone }: { readonly id: string; readonly today: LocalDay; readonly zone: Zone },
): DemoPolicy {
  return {
    ...first,
    ...{ id, name: `Tracheostomy care, ${row.name}`, wardId: row.id },
    startsAt: startOfDay(addDays(today, COMES_IN_DAYS), zone),
    reviewedOn: addDays(today, -1),
    values: { ...first.values, [inspectionInterval.name]: 6 },
    reason: 'Two blocked inner cannulas in October: inspected every 6 hours on this ward',
  }
}

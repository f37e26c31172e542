import { showDate } from '../../time/display.ts'
import { hours } from '../../time/duration.ts'
import { type Clock, intervalClock, noClock, shiftClock, suspended } from '../clock.ts'
import { decannulations } from '../decannulation/schema.ts'
import type { CareContext, Entry, TaskRule } from '../kind.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { absenceWords, sutureRemoval, withoutTube } from '../tube-change/tasks.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { tubeAbsence } from '../tube-change/tube-absence.ts'
import { sitesLeftOut, stomaChecks } from './schema.ts'
import { closingInterval, dressingInterval } from './settings.ts'

const inspection: TaskRule = {
  name: 'stoma-inspection',
  airway: false,
  settings: [closingInterval],
  says: ({ values }) =>
    `Once in each shift: the opening, and the skin under all sides of the flange, under sutures and under the ties. A look at some of these places does not count. After removal for good every ${values.of(closingInterval)} hours until the opening has closed.`,
  clock(context) {
    const { record, ward } = context
    const tube = tubeInPlace(record)
    if (!tube && !isLaryngectomy(context)) return withoutOpening(context)
    // A stoma without a tube has no flange to look under: every check of it counts.
    const last = record.latest(stomaChecks, data => !tube || sitesLeftOut(data).length === 0)
    return shiftClock({ values: context.values, last, start: careFrom(context), ward })
  },
}

const dressingChange: TaskRule = {
  name: 'dressing-change',
  airway: false,
  settings: [dressingInterval],
  opensWith: { dressing: 'changed' },
  says: ({ values }) =>
    `Every ${values.of(dressingInterval)} hours, and whenever it is wet or soiled. Only a change of dressing counts; a tube change is one.`,
  clock(context) {
    const { record, values } = context
    const tube = tubeInPlace(record)
    const lastCheck = record.latest(stomaChecks)
    if (!tube && !isLaryngectomy(context)) return withoutTube(context)
    const bare = lastCheck?.data.dressing === 'none' && !(tube && tube.performedAt > lastCheck.performedAt)
    if (bare) return suspended('no dressing used at the last check')
    if (!tube && !lastCheck) return noClock
    return intervalClock({
      values,
      last: lastDressing(context),
      start: careFrom(context),
      interval: hours(values.of(dressingInterval)),
    })
  },
}

/** A laryngectomy stoma stays open for good, with a tube or without. */
export function isLaryngectomy({ record }: Pick<CareContext, 'record'>): boolean {
  return record.patient.upperAirway === 'not open'
}

/** After removal for good: a look a day until the opening is charted as closed. */
function withoutOpening({ record, values, ward }: CareContext): Clock {
  const absence = tubeAbsence(record)
  if (!absence) return noClock
  if (absence.why === 'came out') return suspended(absenceWords(absence, ward.zone))
  const [last] = record.since(stomaChecks, absence.since)
  if (last?.data.appearance.includes('closed')) {
    return suspended(`opening closed on ${showDate(last.performedAt, ward.zone)}`)
  }
  return intervalClock({ values, last, start: absence.since, interval: hours(values.of(closingInterval)) })
}

/** The latest act that put on a fresh dressing. A tube that was in place on arrival is not an act. */
function lastDressing({ record }: CareContext): Entry | undefined {
  const change = record.latest(stomaChecks, data => data.dressing === 'changed')
  const tube = record.latest(tubeChanges, data => data.difficulty !== 'failed' && data.reason !== 'on arrival')
  if (!change || !tube) return change ?? tube
  return tube.performedAt > change.performedAt ? tube : change
}

/** When care of the opening began: admission, or the first tube since the last removal for good. */
function careFrom(context: CareContext): Date {
  const { admittedAt } = context.record
  if (isLaryngectomy(context)) return admittedAt
  const first = context.record.of(tubeChanges).filter(isSinceRemoval(context)).at(-1)?.performedAt
  return first && first > admittedAt ? first : admittedAt
}

function isSinceRemoval({ record }: CareContext) {
  const removal = record.latest(decannulations)?.performedAt
  return (tube: Entry): boolean => removal === undefined || tube.performedAt > removal
}

export const stomaTasks: readonly TaskRule[] = [inspection, dressingChange, sutureRemoval]

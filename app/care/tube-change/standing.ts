import { daysLeft, dwellDay, dwellStage } from '../../clinical/dwell.ts'
import { localDay } from '../../time/zone.ts'
import type { CareContext } from '../kind.ts'
import { recalledInPlace } from '../recall.ts'
import type { Warning } from '../warning.ts'
import { dwellNotice, dwellStrongNotice } from './dwell-settings.ts'
import { suturesOutBy } from './settings.ts'
import { suturesIn } from './tasks.ts'
import { dwellLimit, insertedOn, type TubeEntry, tubeInPlace } from './tube.ts'
import { tubeAbsence } from './tube-absence.ts'
import { dayWords, standingDisplacements, standingTubeOut } from './tube-out.ts'

/** What stands by the tubes charted so far: one that did not go in, dwell, sutures; or that none is charted. */
export function standingTubeWarnings(context: CareContext): readonly Warning[] {
  const tube = tubeInPlace(context.record)
  return [
    ...standingTubeOut(context),
    ...(tube ? [...dwell(tube, context), ...sutures(tube, context)] : notCharted(context)),
    ...standingDisplacements(context),
    ...(tube ? recalledInPlace('tube', tube.data, context.ward) : []),
  ]
}

/** A laryngectomy may have no tube at all; of anybody else here it says that no tube care can be due. */
function notCharted({ record }: CareContext): readonly Warning[] {
  if (tubeAbsence(record) || record.patient.upperAirway === 'not open') return []
  return [
    {
      name: 'tube-not-charted',
      level: 'blue',
      action: 'Chart the tube that is in place.',
      cause: 'No tube is charted, so none of its care can be shown as due.',
      source: 'Product proposal',
    },
  ]
}

function sutures(tube: TubeEntry, context: CareContext): readonly Warning[] {
  const day = dwellDay(insertedOn(tube, context), localDay(context.now, context.ward.zone))
  const outBy = context.values.of(suturesOutBy)
  if (!suturesIn(context) || day <= outBy) return []
  return [
    {
      name: 'sutures-past-day',
      level: 'amber',
      action: 'Ask the tracheostomy team about the flange sutures today.',
      cause: `Day ${day}; sutures come out by day ${outBy}.`,
      source: suturesOutBy.source.says,
    },
  ]
}

function dwell(tube: TubeEntry, context: CareContext): readonly Warning[] {
  const { values, ward, now } = context
  const limit = dwellLimit(tube, context)
  const on = insertedOn(tube, context)
  const today = localDay(now, ward.zone)
  const left = daysLeft(on, limit.days, today)
  const stage = dwellStage(left, { noticeDays: values.of(dwellNotice), strongDays: values.of(dwellStrongNotice) })
  if (stage === 'quiet') return []
  const source = `Limit by ${limit.because}`
  if (stage === 'past limit') {
    return [
      {
        name: 'tube-past-limit',
        level: 'amber',
        action: 'Tell the tracheostomy team today.',
        cause: `Tube is ${dwellDay(on, today)} days in; limit is ${limit.days}.`,
        source,
      },
    ]
  }
  return [
    {
      name: 'tube-near-limit',
      level: stage === 'notice' ? 'blue' : 'amber',
      action: stage === 'limit day' ? 'The tube change is due today.' : 'Plan the tube change.',
      cause: `Day ${dwellDay(on, today)} of ${limit.days}; ${left === 0 ? 'today is the limit day' : `${dayWords(left)} left`}.`,
      source,
    },
  ]
}

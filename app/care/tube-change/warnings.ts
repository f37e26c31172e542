import { daysLeft, dwellDay, dwellStage } from '../../clinical/dwell.ts'
import { hours, since } from '../../time/duration.ts'
import { localDay, startOfDay } from '../../time/zone.ts'
import type { CareContext } from '../kind.ts'
import { LOCAL_PLAN, type Warning } from '../warning.ts'
import type { TubeData } from './schema.ts'
import {
  blindReinsertionBefore,
  dwellNotice,
  dwellStrongNotice,
  firstChangeHardLimit,
  suturesOutBy,
} from './settings.ts'
import { firstChangeDays, suturesIn } from './tasks.ts'
import { dwellLimit, insertedOn, isFirstTube, stomaAgeDays, tubeInPlace, tubeWords } from './tube.ts'

const EMERGENCY = ['blocked', 'displaced', 'fault']

/** What a tube change asks people to notice as it is charted. Never a refusal: it has happened. */
export function tubeWarnings(data: TubeData, context: CareContext): readonly Warning[] {
  return [
    ...failedChange(data, context),
    ...earlyChange(data, context),
    ...bleeding(data),
    ...unconfirmed(data),
    ...noInnerCannula(data),
    ...expired(data, context),
  ]
}

function failedChange(data: TubeData, context: CareContext): readonly Warning[] {
  const age = stomaAgeDays(context)
  const fresh = age !== undefined && age < context.values.of(blindReinsertionBefore)
  if (data.difficulty !== 'failed' && !(data.reason === 'displaced' && fresh)) return []
  const laryngectomy = context.record.patient.upperAirway === 'not open'
  const oxygen = laryngectomy
    ? 'Oxygen to the stoma. The mouth does not connect to the lungs.'
    : 'Oxygen to face and stoma.'
  return [
    {
      name: 'tube-out',
      level: 'red',
      action: `Call for help now. ${oxygen}${fresh ? ' Do not push the tube back blindly.' : ''} ${LOCAL_PLAN}`,
      cause: fresh ? `The opening is ${age} days old.` : 'The tube did not go in.',
      source: 'Bontempo and Manning; critical care texts differ between 5 and 7 days',
    },
  ]
}

function earlyChange(data: TubeData, context: CareContext): readonly Warning[] {
  const tube = tubeInPlace(context.record)
  if (!tube || !isFirstTube(tube) || EMERGENCY.includes(data.reason)) return []
  const age = dwellDay(insertedOn(tube, context), localDay(context.now, context.ward.zone))
  const putInAt = tube.data.insertedOn ? startOfDay(tube.data.insertedOn, context.ward.zone) : tube.performedAt
  const tooEarly = since(putInAt, context.now) < hours(context.values.of(firstChangeHardLimit))
  if (!tooEarly && age >= firstChangeDays(context).earliest) return []
  return [
    {
      name: 'first-change-early',
      level: 'amber',
      action: `Ask ENT or ICU to review today.`,
      cause: `The opening is only ${age} days old.${tooEarly ? ` Before ${context.values.of(firstChangeHardLimit)} hours a change is for emergencies.` : ''}`,
      source: firstChangeHardLimit.source.says,
    },
  ]
}

function bleeding(data: TubeData): readonly Warning[] {
  if (data.bleeding !== 'fresh' && data.bleeding !== 'active') return []
  return [
    {
      name: 'bleeding',
      level: 'red',
      action: `Call for help now and stay with the patient. Leave the tube in; if it has a cuff, keep it up. Treat this as a warning bleed. ${LOCAL_PLAN}`,
      cause: 'Fresh blood at the tube change.',
      source: 'Bontempo and Manning: every bleed counts as a warning bleed',
    },
  ]
}

function unconfirmed(data: TubeData): readonly Warning[] {
  if (data.position !== 'not confirmed' || data.difficulty === 'failed' || data.reason === 'on arrival') return []
  return [
    {
      name: 'position-not-confirmed',
      level: 'amber',
      action: 'Confirm the position now, by capnography or airflow.',
      cause: 'A tube beside the windpipe can look well placed.',
      source: 'Common practice',
    },
  ]
}

function noInnerCannula(data: TubeData): readonly Warning[] {
  if (data.construction !== 'dual' || data.innerCannula !== 'none') return []
  return [
    {
      name: 'inner-cannula-absent',
      level: data.connector === 'inner' ? 'red' : 'amber',
      action: `Fit the correct inner cannula now.${data.connector === 'inner' ? ` Without it the bag may not connect. ${LOCAL_PLAN}` : ''}`,
      cause: 'A dual-cannula tube without its inner cannula.',
      source: 'Common practice',
    },
  ]
}

function expired(data: TubeData, context: CareContext): readonly Warning[] {
  const day = data.insertedOn ?? localDay(context.now, context.ward.zone)
  if (!data.expiresOn || data.expiresOn >= day) return []
  return [
    {
      name: 'tube-expired',
      level: 'amber',
      action: 'Tell the tracheostomy team and keep the packaging.',
      cause: 'The tube was past its expiry date when it went in.',
      source: 'Device labelling',
    },
  ]
}

/** What stands for as long as this tube is in: dwell and sutures. */
export function standingTubeWarnings(context: CareContext): readonly Warning[] {
  const tube = tubeInPlace(context.record)
  if (!tube) return []
  const today = localDay(context.now, context.ward.zone)
  const inDays = dwellDay(insertedOn(tube, context), today)
  const suturesLate = suturesIn(context) && inDays > context.values.of(suturesOutBy)
  const sutures: Warning = {
    name: 'sutures-past-day',
    level: 'amber',
    action: 'Ask the tracheostomy team about the flange sutures today.',
    cause: `Day ${inDays}; sutures come out by day ${context.values.of(suturesOutBy)}.`,
    source: suturesOutBy.source.says,
  }
  return [...dwellWarning(context), ...(suturesLate ? [sutures] : [])]
}

function dwellWarning(context: CareContext): readonly Warning[] {
  const tube = tubeInPlace(context.record)
  if (!tube) return []
  const limit = dwellLimit(tube, context)
  const today = localDay(context.now, context.ward.zone)
  const on = insertedOn(tube, context)
  const left = daysLeft(on, limit.days, today)
  const stage = dwellStage(left, {
    noticeDays: context.values.of(dwellNotice),
    strongDays: context.values.of(dwellStrongNotice),
  })
  if (stage === 'quiet') return []
  const common = { source: `Limit by ${limit.because}` }
  if (stage === 'past limit') {
    return [
      {
        ...common,
        name: 'tube-past-limit',
        level: 'amber',
        action: 'Tell the tracheostomy team today.',
        cause: `Tube is ${dwellDay(on, today)} days in; limit is ${limit.days}.`,
      },
    ]
  }
  return [
    {
      ...common,
      name: 'tube-near-limit',
      level: stage === 'notice' ? 'blue' : 'amber',
      action: stage === 'limit day' ? 'The tube change is due today.' : 'Plan the tube change.',
      cause: `Day ${dwellDay(on, today)} of ${limit.days}; ${left === 0 ? 'today is the limit day' : `${left} ${left === 1 ? 'day' : 'days'} left`}.`,
    },
  ]
}

/** The usual change: the same tube again. Findings and people are left to fill in. */
export function sameTubeAgain(context: CareContext) {
  const tube = tubeInPlace(context.record)?.data
  if (!tube) return undefined
  const { line, sizeSystem, size, idWithInner, idWithoutInner, od, lengthMm, cuff, construction } = tube
  const { innerCannula, fenestrated, connector, flange, longestUseDays } = tube
  const answers = { line, sizeSystem, size, idWithInner, idWithoutInner, od, lengthMm, cuff, construction }
  return {
    words: `Same tube as now: ${tubeWords(tube)}`,
    answers: { ...answers, innerCannula, fenestrated, connector, flange, longestUseDays },
  }
}

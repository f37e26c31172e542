import { dwellDay } from '../../clinical/dwell.ts'
import { hours, since } from '../../time/duration.ts'
import { localDay } from '../../time/zone.ts'
import { tubeBackNow } from '../decannulation/failed.ts'
import { BLEED_ACTION } from '../emergency.ts'
import { absentWarning } from '../inner-cannula/fit.ts'
import type { CareContext } from '../kind.ts'
import { bleedCause } from '../suction/bleeding.ts'
import { bleedWindowTo } from '../suction/bleeding-settings.ts'
import { lowSaturation } from '../suction/saturation.ts'
import type { Warning } from '../warning.ts'
import { firstChangeDays } from './first-change.ts'
import type { TubeData } from './schema.ts'
import { firstChangeHardLimit } from './settings.ts'
import { insertedAt, insertedOn, isFirstTube, tubeInPlace, tubeWords } from './tube.ts'
import { lastTube } from './tube-absence.ts'
import { dayWords, displacedAgain, tubeOut } from './tube-out.ts'

const EMERGENCY = ['blocked', 'displaced', 'fault']
/** Charted of a tube that is new to the record: nothing was changed. */
const NO_CHANGE = ['first insertion', 'on arrival']

/** What a tube change asks people to notice as it is charted. Never a refusal: it has happened. */
export function tubeWarnings(data: TubeData, context: CareContext): readonly Warning[] {
  return [
    ...tubeOut(data, context),
    ...earlyChange(data, context),
    ...bleeding(data, context),
    ...lowSaturation('tube-change-spo2-low', data, context),
    ...unconfirmed(data),
    ...noInnerCannula(data),
    ...displacedAgain(data, context),
    ...(data.difficulty === 'failed' ? [] : tubeBackNow(context)),
    ...expired(data, context),
    ...datesInDoubt(data, context),
  ]
}

/** Said before the change as well, while the form is filled in: the act fits both. */
function earlyChange(data: TubeData, context: CareContext): readonly Warning[] {
  const tube = tubeInPlace(context.record)
  if (!tube || !isFirstTube(tube) || [...EMERGENCY, ...NO_CHANGE].includes(data.reason)) return []
  const age = dwellDay(insertedOn(tube, context), localDay(context.now, context.ward.zone))
  const limit = context.values.of(firstChangeHardLimit)
  const tooEarly = since(insertedAt(tube, context), context.now) < hours(limit)
  if (!tooEarly && age >= firstChangeDays(context).earliest) return []
  return [
    {
      name: 'first-change-early',
      level: 'amber',
      action: 'Ask ENT or ICU before changing. If it is done, ask them to review today.',
      cause: `The opening is only ${dayWords(age)} old.${tooEarly ? ` Before ${limit} hours a change is for emergencies.` : ''}`,
      source: firstChangeHardLimit.source.says,
    },
  ]
}

function bleeding({ bleeding }: TubeData, context: CareContext): readonly Warning[] {
  if (bleeding === undefined || bleeding === 'none') return []
  const isSpotting = bleeding === 'spotting'
  const seen = isSpotting ? 'Spotting of blood at the tube change' : 'Fresh blood at the tube change'
  return [
    {
      name: 'bleeding',
      level: isSpotting ? 'amber' : 'red',
      action: isSpotting
        ? 'Ask a doctor to look at the bleeding this shift, and look again within the hour.'
        : BLEED_ACTION,
      cause: bleedCause(seen, context),
      source: bleedWindowTo.source.says,
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

function noInnerCannula({ construction, innerCannula, connector }: TubeData): readonly Warning[] {
  return construction === 'dual' && innerCannula === 'none' ? [absentWarning(connector)] : []
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

/** Dwell and tract are counted from these days, so a slip of the keys would move every date after it. */
function datesInDoubt({ insertedOn: on, stomaMadeOn: made }: TubeData, { now, ward }: CareContext): readonly Warning[] {
  const today = localDay(now, ward.zone)
  const isAhead = (on !== undefined && on > today) || (made !== undefined && made > today)
  if (!isAhead && !(on !== undefined && made !== undefined && made > on)) return []
  return [
    {
      name: 'tube-dates',
      level: 'amber',
      action: 'Read the dates again.',
      cause: isAhead ? 'A date lies ahead.' : 'The opening is charted as made after this tube went in.',
      source: 'Change-by date and age of the opening are counted from these days',
    },
  ]
}

/** The usual change: the same tube again, or the one that came out. Findings and people, and what is read on this one, are left to fill in. */
export function sameTubeAgain({ record }: CareContext) {
  const tube = lastTube(record)?.data
  if (!tube) return undefined
  const { line, sizeSystem, size, idWithInner, idWithoutInner, od, lengthMm, cuff, construction } = tube
  const { fenestrated, connector, flange, longestUseDays } = tube
  const innerCannula = tube.innerCannula === 'none' ? undefined : tube.innerCannula
  const answers = { line, sizeSystem, size, idWithInner, idWithoutInner, od, lengthMm, cuff, construction }
  return {
    words: `Same tube as ${tubeInPlace(record) ? 'now' : 'the one that came out'}: ${tubeWords(tube)}`,
    answers: { ...answers, innerCannula, fenestrated, connector, flange, longestUseDays },
  }
}

import { isTooLarge, largestCatheter } from '../../clinical/suction-catheter.ts'
import { convertPressure, showPressure } from '../../clinical/units.ts'
import { vacuumClass, vacuumMmHg } from '../../clinical/vacuum.ts'
import type { CareContext } from '../kind.ts'
import type { Values } from '../policy.ts'
import { tubeInPlace, workingIdMm } from '../tube-change/tube.ts'
import type { Warning } from '../warning.ts'
import { catheterRule } from './catheter.ts'
import { catheterFr, isThroughTube, type SuctionData } from './schema.ts'
import {
  catheterShare,
  mostPasses,
  passLimit,
  passWarn,
  vacuumLow,
  vacuumUnitDoubt,
  vacuumVeryHigh,
  vacuumWarn,
} from './settings.ts'

/** What the way of suctioning asks people to notice: catheter, vacuum, passes. */
export function techniqueWarnings(data: SuctionData, context: CareContext): readonly Warning[] {
  if (!isThroughTube(data)) return []
  return [
    ...fenestration(data, context),
    ...catheterTooLarge(data, context),
    ...unitInDoubt(data, context),
    ...vacuumHigh(data, context),
    ...longPass(data, context),
    ...manyPasses(data, context),
  ]
}

function fenestration(data: SuctionData, { record }: CareContext): readonly Warning[] {
  if (tubeInPlace(record)?.data.fenestrated !== 'yes' || data.innerCannula === 'plain') return []
  return [
    {
      name: 'suction-fenestrated',
      level: 'amber',
      action: 'Change to the plain inner cannula before suction.',
      cause: 'The tube is fenestrated: a catheter can pass through the hole and injure the wall of the windpipe.',
      source: 'LITFL and a teaching site on fenestrated tubes',
    },
  ]
}

function catheterTooLarge(data: SuctionData, { record, values }: CareContext): readonly Warning[] {
  const fr = catheterFr(data)
  const tube = tubeInPlace(record)?.data
  if (fr === undefined || !tube) return []
  const idMm = workingIdMm(tube)
  const rule = catheterRule(values)
  if (!isTooLarge(fr, idMm, rule)) return []
  const largest = largestCatheter(idMm, rule)
  return [
    {
      name: 'suction-catheter-large',
      level: 'amber',
      action: largest
        ? `Largest size for this tube is ${largest} Fr.`
        : 'No size in stock is small enough for this tube. Ask the tracheostomy team.',
      cause: `${fr} Fr takes more than ${values.of(catheterShare)}% of an inside diameter of ${idMm} mm.`,
      source: catheterShare.source.says,
    },
  ]
}

/** Below about 40 in mmHg and above it in kPa no vacuum is used: the number was read in the other unit. */
function unitInDoubt({ vacuum, vacuumUnit }: SuctionData, { values }: CareContext): readonly Warning[] {
  if (vacuum === undefined || vacuumUnit === undefined) return []
  const doubt = values.of(vacuumUnitDoubt)
  if (vacuumUnit === 'mmHg' ? vacuum >= doubt : vacuum <= doubt) return []
  const other = vacuumUnit === 'mmHg' ? 'kPa' : 'mmHg'
  return [
    {
      name: 'suction-vacuum-unit',
      level: 'amber',
      action: 'Read the unit on the vacuum gauge again.',
      cause: `${vacuum} ${vacuumUnit} is ${showPressure(convertPressure(vacuum, vacuumUnit, other), other)}, which is not used for suction.`,
      source: vacuumUnitDoubt.source.says,
    },
  ]
}

function vacuumHigh({ vacuum, vacuumUnit }: SuctionData, { values }: CareContext): readonly Warning[] {
  if (vacuum === undefined || vacuumUnit === undefined) return []
  const limits = { warnAbove: values.of(vacuumWarn), confirmAbove: values.of(vacuumVeryHigh) }
  const stands = vacuumClass(vacuumMmHg(vacuum, vacuumUnit), limits)
  if (stands === 'in range') return []
  const isVeryHigh = stands === 'to confirm'
  return [
    {
      name: isVeryHigh ? 'suction-vacuum-very-high' : 'suction-vacuum-high',
      level: 'amber',
      action: `Turn suction down to ${rangeWords(vacuumUnit, values)}${isVeryHigh ? ' now, and read the gauge again' : ''}.`,
      cause: `${vacuum} ${vacuumUnit} is above ${showPressure(isVeryHigh ? limits.confirmAbove : limits.warnAbove, 'mmHg')}.`,
      source: (isVeryHigh ? vacuumVeryHigh : vacuumWarn).source.says,
    },
  ]
}

/** `80 to 150 mmHg`, and for a gauge in kPa `80 to 150 mmHg (10.7 to 20 kPa)`. */
function rangeWords(unit: 'mmHg' | 'kPa', values: Values): string {
  const [low, high] = [values.of(vacuumLow), values.of(vacuumWarn)]
  const inMmHg = `${low} to ${high} mmHg`
  if (unit === 'mmHg') return inMmHg
  const [from, to] = [low, high].map(value => showPressure(convertPressure(value, 'mmHg', 'kPa'), 'kPa'))
  return `${inMmHg} (${from?.replace(' kPa', '')} to ${to})`
}

/** The amber and red of a running timer are for the pass itself; charted afterwards they are a note and an amber. */
function longPass({ longestPassS }: SuctionData, { values }: CareContext): readonly Warning[] {
  if (longestPassS === undefined || longestPassS <= values.of(passWarn)) return []
  const isTooLong = longestPassS > values.of(passLimit)
  return [
    {
      name: isTooLong ? 'suction-pass-too-long' : 'suction-pass-long',
      level: isTooLong ? 'amber' : 'blue',
      action: isTooLong
        ? `Let the patient recover and check SpO2. Keep each pass within ${values.of(passLimit)} seconds.`
        : `Keep each pass within ${values.of(passWarn)} seconds.`,
      cause: `The longest pass took ${longestPassS} seconds.`,
      source: (isTooLong ? passLimit : passWarn).source.says,
    },
  ]
}

function manyPasses({ passes }: SuctionData, { values }: CareContext): readonly Warning[] {
  if (passes === undefined || passes <= values.of(mostPasses)) return []
  return [
    {
      name: 'suction-many-passes',
      level: 'blue',
      action: `Let the patient rest. Keep to ${values.of(mostPasses)} passes; review humidity if that does not clear the tube.`,
      cause: `${passes} passes in one episode.`,
      source: mostPasses.source.says,
    },
  ]
}

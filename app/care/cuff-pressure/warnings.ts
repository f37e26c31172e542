import { toCmH2O } from '../../clinical/units.ts'
import { earlier, hours } from '../../time/duration.ts'
import type { CareContext } from '../kind.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { LOCAL_PLAN, type Warning } from '../warning.ts'
import { cuffBand, cuffState, foundClass, leftClass } from './cuff.ts'
import { type CuffData, cuffChecks, foundCmH2O, leftCmH2O } from './schema.ts'
import { cuffLower, cuffTopUpCount, cuffUpper } from './settings.ts'

/** What a cuff check asks people to notice. The found value is classed, unrounded, in cmH2O. */
export function cuffWarnings(data: CuffData, context: CareContext): readonly Warning[] {
  return [...wrongCuff(data, context), ...outOfBand(data, context), ...unitTrap(data, context), ...leak(data, context)]
}

function outOfBand(data: CuffData, context: CareContext): readonly Warning[] {
  const found = foundClass(data, context)
  const left = leftClass(data, context)
  if (!found || (found === 'in range' && left === 'in range')) return []
  const { lower, upper } = cuffBand(context.values)
  if (left === 'in range') return [corrected(found, lower, upper)]
  const high = left === 'high' || left === 'very high'
  const weak = context.record.patient.ventilated
  return [
    {
      name: high ? 'cuff-high' : 'cuff-low',
      level: 'amber',
      action: high
        ? `Let air out slowly to ${lower} to ${upper} cmH2O and check again in 30 minutes.${left === 'very high' ? ' Do it now.' : ''}`
        : `Add air to ${lower} to ${upper} cmH2O.${left === 'very low' && weak ? ' Do it now: the patient is ventilated.' : ''} If it keeps falling, check tube and pilot line.`,
      cause: high
        ? `Above ${upper} cmH2O the cuff can harm the wall of the windpipe.`
        : `Below ${lower} cmH2O secretions can pass the cuff.`,
      source: high ? cuffUpper.source.says : cuffLower.source.says,
    },
  ]
}

function corrected(found: string, lower: number, upper: number): Warning {
  return {
    name: 'cuff-corrected',
    level: 'blue',
    action: 'Look for the cause and check again at the next round.',
    cause: `Found ${found}, left within ${lower} to ${upper} cmH2O.`,
    source: cuffUpper.source.says,
  }
}

function wrongCuff(data: CuffData, { record }: CareContext): readonly Warning[] {
  const state = cuffState(record)
  if (data.found === undefined || !['no cuff', 'foam', 'water'].includes(state)) return []
  const words = state === 'no cuff' ? 'a tube without a cuff' : `a ${state} cuff`
  return [
    {
      name: 'cuff-not-air',
      level: 'amber',
      action:
        state === 'water'
          ? 'Measure this cuff in mL of sterile water.'
          : 'Check which tube is in and correct the record.',
      cause: `The record shows ${words}; a pressure in ${data.unit} does not apply.`,
      source: 'Device instructions; common practice',
    },
  ]
}

/** 25 on a gauge in mmHg is 34 cmH2O: when the unit differs from the ward's, or the same digits would be in range in the other unit. */
function unitTrap(data: CuffData, { ward, values }: CareContext): readonly Warning[] {
  if (data.found === undefined || data.unit === ward.pressureUnit) return []
  const { lower, upper } = cuffBand(values)
  const asRead = toCmH2O(data.found, data.unit)
  const asWard = toCmH2O(data.found, ward.pressureUnit)
  const differs = (asRead < lower || asRead > upper) !== (asWard < lower || asWard > upper)
  return [
    {
      name: 'cuff-unit',
      level: differs ? 'amber' : 'blue',
      action: 'Read the unit on the gauge again.',
      cause: `${data.found} ${data.unit} is ${Math.round(asRead)} cmH2O; gauges of this ward read in ${ward.pressureUnit}.`,
      source: 'Exact conversion: 1 cmH2O is 98.0665 Pa, 1 mmHg is 133.322387415 Pa',
    },
  ]
}

function leak(data: CuffData, context: CareContext): readonly Warning[] {
  const topUps = topUpsBefore(context) + (isTopUp(data) ? 1 : 0)
  const repeated = topUps >= context.values.of(cuffTopUpCount)
  if (data.leak === 'yes' && (repeated || isTopUp(data))) {
    return [
      {
        name: 'cuff-leak-displacement',
        level: 'red',
        action: `Check the tube position now. The tube or cuff may have moved or failed. Call for help. ${LOCAL_PLAN}`,
        cause: 'Leak or voice with the cuff up, and air added.',
        source: 'Red flag in teaching texts (NHS Wales, RCEM learning)',
      },
    ]
  }
  return isTopUp(data) && repeated ? [repeatedLeak(topUps)] : []
}

function repeatedLeak(topUps: number): Warning {
  return {
    name: 'cuff-repeated-leak',
    level: 'amber',
    action: 'Do not add more air. Ask for a review of tube size and position.',
    cause: `Air added ${topUps} times within 12 hours.`,
    source: cuffTopUpCount.source.says,
  }
}

function isTopUp(data: CuffData): boolean {
  const found = foundCmH2O(data)
  const left = leftCmH2O(data)
  return (data.airMl ?? 0) > 0 || (found !== undefined && left !== undefined && left > found)
}

function topUpsBefore({ record, now }: CareContext): number {
  const tube = tubeInPlace(record)
  return record
    .since(cuffChecks, earlier(now, hours(12)))
    .filter(
      entry => entry.performedAt <= now && (!tube || entry.performedAt >= tube.performedAt) && isTopUp(entry.data),
    ).length
}

/** Stands until the next reading: the cuff was left out of the band, or keeps losing air. */
export function standingCuffWarnings(context: CareContext): readonly Warning[] {
  if (cuffState(context.record) !== 'inflated') return []
  const tube = tubeInPlace(context.record)
  const last = context.record.latest(cuffChecks, data => data.found !== undefined)
  if (!last || (tube && last.performedAt < tube.performedAt)) return []
  const topUps = topUpsBefore(context)
  return [
    ...outOfBand(last.data, context).filter(warning => warning.level !== 'blue'),
    ...(topUps >= context.values.of(cuffTopUpCount) ? [repeatedLeak(topUps)] : []),
  ]
}

import { toCmH2O } from '../../clinical/units.ts'
import type { CareContext } from '../kind.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import type { Warning } from '../warning.ts'
import { cuffBand, cuffState, foundClass, leftClass } from './cuff.ts'
import { leakWarnings, standingLeakWarnings } from './leak.ts'
import { type CuffData, cuffChecks } from './schema.ts'
import { cuffLower, cuffRecheck, cuffUpper } from './settings.ts'

/** What a cuff check asks people to notice. The found value is classed, unrounded, in cmH2O. */
export function cuffWarnings(data: CuffData, context: CareContext): readonly Warning[] {
  const leaks = leakWarnings(data, context)
  return [
    ...wrongCuff(data, context),
    ...leaks,
    ...besides(leaks, outOfBand(data, context)),
    ...unitTrap(data, context),
  ]
}

/** Where a leak says to add no more air, nothing else may ask for it. */
function besides(leaks: readonly Warning[], others: readonly Warning[]): readonly Warning[] {
  return leaks.some(({ name }) => name !== 'cuff-leak') ? others.filter(({ name }) => name !== 'cuff-low') : others
}

function outOfBand(data: CuffData, context: CareContext): readonly Warning[] {
  const found = foundClass(data, context)
  const left = leftClass(data, context)
  if (!left) return []
  const { lower, upper } = cuffBand(context.values)
  if (left === 'in range') return !found || found === left ? [] : [corrected(found, lower, upper)]
  const high = left === 'high' || left === 'very high'
  const weak = context.record.patient.ventilated
  return [
    {
      name: high ? 'cuff-high' : 'cuff-low',
      level: 'amber',
      action: high
        ? `Let air out slowly to ${lower} to ${upper} cmH2O and check again in ${context.values.of(cuffRecheck)} minutes.${left === 'very high' ? ' Do it now.' : ''}`
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

/** Stands until the next look: the cuff was left out of the band, leaks, or keeps losing air. */
export function standingCuffWarnings(context: CareContext): readonly Warning[] {
  const tube = tubeInPlace(context.record)
  if (!tube || cuffState(context.record) !== 'inflated') return []
  const onTube = context.record.since(cuffChecks, tube.performedAt)
  const reading = onTube.find(({ data }) => data.found !== undefined)
  const look = onTube.find(({ data }) => data.found !== undefined || data.leak !== undefined)
  const leaks = standingLeakWarnings(look, context)
  const outside = reading ? outOfBand(reading.data, context).filter(({ level }) => level !== 'blue') : []
  return [...leaks, ...besides(leaks, outside)]
}

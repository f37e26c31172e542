import { fromCmH2O, showPressure } from '../../clinical/units.ts'
import type { CareContext, WardFacts } from '../kind.ts'
import type { Measure, MeasureTrend, ReadingValue } from '../trend.ts'
import { cuffBand, cuffState, foundClass, leftClass } from './cuff.ts'
import { type CuffData, foundCmH2O, leftCmH2O } from './schema.ts'
import { cuffLower, cuffUpper } from './settings.ts'

const MOST_CMH2O = 50 // as the gauge of the form

const inUnit = (cmH2O: number, ward: WardFacts): number => fromCmH2O(cmH2O, ward.pressureUnit)

const pressure: Measure = {
  name: 'cuff-pressure',
  title: 'Cuff pressure',
  says: 'Found and left at, against the band in force at that moment. Values are compared unrounded.',
  unit: ward => ward.pressureUnit,
  range: ward => ({ from: 0, to: inUnit(MOST_CMH2O, ward) }),
  marks: { found: 'Found', left: 'Left at' },
  isJoined: false,
  settings: [cuffLower, cuffUpper],
  band: ({ values, ward }) => {
    const { lower, upper } = cuffBand(values)
    return { lower: inUnit(lower, ward), upper: inUnit(upper, ward) }
  },
  show: (value, ward) => showPressure(value, ward.pressureUnit),
}

/** Pressures found and left at, in the unit of the ward; checks without a measurement have none. */
export const cuffTrends: readonly MeasureTrend<CuffData>[] = [{ shape: 'measure', measure: pressure, reading }]

function reading(data: CuffData, before: CareContext) {
  const [found, left] = [foundCmH2O(data), leftCmH2O(data)]
  if (found === undefined || left === undefined) return undefined
  const [foundIs, leftIs] = [foundClass(data, before), leftClass(data, before)]
  const value = (mark: string, cmH2O: number, is: string | undefined): ReadingValue => ({
    mark,
    value: inUnit(cmH2O, before.ward),
    ...(is === undefined ? {} : { isOut: is !== 'in range' }),
  })
  return {
    values: [value('found', found, foundIs), value('left', left, leftIs)],
    remark: remark(data, before, [foundIs, leftIs]),
  }
}

/** How both stand: `In range`, `Found high, left in range`, or why the band does not apply. */
function remark(data: CuffData, { record }: CareContext, [found, left]: readonly (string | undefined)[]): string {
  if (found !== undefined) return found === left ? capital(found) : `Found ${found}, left ${left ?? 'without a band'}`
  if (left !== undefined) return `Was down, left ${left}`
  const state = data.cuffNow === 'deflated' ? 'deflated' : cuffState(record)
  return state === 'deflated' ? 'Cuff down: no band applies' : 'No band applies to this cuff'
}

const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1)

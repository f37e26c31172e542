import { isBelowTarget } from '../../clinical/observations.ts'
import type { CareContext } from '../kind.ts'
import type { Measure, MeasureTrend, Reading } from '../trend.ts'
import { type ObservationData, oxygenDevices } from './schema.ts'

const LOWEST = 80 // %; lower values are drawn at the edge

/** SpO2 against the prescribed target, by whatever it was charted. */
export const saturation: Measure = {
  name: 'spo2',
  title: 'SpO2',
  says: 'Oxygen saturation against the prescribed target, with what was breathed.',
  unit: () => '%',
  range: () => ({ from: LOWEST, to: 100 }),
  marks: { spo2: 'SpO2' },
  isJoined: true,
  settings: [],
  band: ({ record: { patient } }) =>
    patient.spo2Low === null
      ? undefined
      : { lower: patient.spo2Low, ...(patient.spo2High === null ? {} : { upper: patient.spo2High }) },
  bandSays: 'Target as it is prescribed now',
  show: value => `${value}%`,
}

/** One value of SpO2, out of range below the target as everywhere, with what was breathed. */
export function saturationReading(spo2: number, breathed: string, { record }: CareContext): Reading {
  const { spo2Low } = record.patient
  const isOut = spo2Low !== null && isBelowTarget(spo2, spo2Low)
  return {
    values: [{ mark: 'spo2', value: spo2, ...(spo2Low === null ? {} : { isOut }) }],
    remark: `${isOut ? 'Below target. ' : ''}${breathed}`,
  }
}

/** SpO2 of every set. */
export const observationTrends: readonly MeasureTrend<ObservationData>[] = [
  {
    shape: 'measure',
    measure: saturation,
    reading: (data, before) => saturationReading(data.spo2, breathed(data), before),
  },
]

function breathed({ oxygen, fio2, flow }: ObservationData): string {
  const share = fio2 === undefined ? (flow === undefined ? '' : `, ${flow} L/min`) : `, FiO2 ${fio2}%`
  return `${oxygenDevices[oxygen]}${share}`
}

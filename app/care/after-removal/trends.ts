import { saturation, saturationReading } from '../observations/trends.ts'
import type { MeasureTrend } from '../trend.ts'
import type { AfterRemovalData } from './schema.ts'

/** SpO2 goes on in the same plot after the tube was taken out. */
export const afterRemovalTrends: readonly MeasureTrend<AfterRemovalData>[] = [
  {
    shape: 'measure',
    measure: saturation,
    reading: ({ spo2 }, before) => saturationReading(spo2, 'After removal', before),
  },
]

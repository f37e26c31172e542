import type { MeasureTrend } from '../trend.ts'
import { colourFlags, type SecretionGradeData, scoreColumns } from './schema.ts'
import { secretionScore } from './score.ts'

const GRADES = 3

/** The sum of the grades over the days. It has no target: it compares days of one patient. */
export const secretionTrends: readonly MeasureTrend<SecretionGradeData>[] = [
  {
    shape: 'measure',
    measure: {
      name: 'secretion-sum',
      title: 'Secretion sum',
      says: 'Sum of five grades, 0 to 15; higher is worse. It compares days of one patient and decides nothing.',
      unit: () => 'points',
      range: () => ({ from: 0, to: GRADES * Object.keys(scoreColumns).length }),
      marks: { sum: 'Sum' },
      isJoined: true,
      settings: [],
      show: value => String(value),
    },
    reading: data => ({ values: [{ mark: 'sum', value: secretionScore(data) }], remark: remark(data) }),
  },
]

/** What the sum is made of, and what was seen beside it: `Vigorous, 1 pass, tan, thick`. */
function remark({ cough, passes, colour, viscosity, flags }: SecretionGradeData): string {
  const seen = flags.filter(flag => flag !== 'none').map(flag => colourFlags[flag].toLowerCase())
  return [
    `Cough ${scoreColumns.cough[cough].toLowerCase()}`,
    passes === 'none' ? 'nothing to clear' : scoreColumns.passes[passes],
    scoreColumns.colour[colour].toLowerCase(),
    scoreColumns.viscosity[viscosity].toLowerCase(),
    ...seen,
  ].join(', ')
}

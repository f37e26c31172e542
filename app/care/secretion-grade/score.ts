import { type ScoreColumn, type SecretionGradeData, scoreColumns } from './schema.ts'

/** The five graded columns of a grading. */
export type Graded = Pick<SecretionGradeData, ScoreColumn>

/** The grade of one column, 0 (best) to 3: the place of the answer in its list. */
export function gradeOf(column: ScoreColumn, data: Graded): number {
  return Object.keys(scoreColumns[column]).indexOf(data[column])
}

/** The Airway Care Score: the sum of the five grades, 0 to 15, higher is worse (Critical Care 2008, table 1). */
export function secretionScore(data: Graded): number {
  return (Object.keys(scoreColumns) as ScoreColumn[]).reduce((sum, column) => sum + gradeOf(column, data), 0)
}

import type { Entry, PatientRecord } from '../kind.ts'
import { coreCriteria, furtherCriteria, type ReadinessData, readinessChecks } from './schema.ts'

export type CriterionName = keyof typeof coreCriteria | keyof typeof furtherCriteria

/** One criterion as the record has it. */
export interface Criterion {
  readonly name: CriterionName
  readonly label: string
  /** One of the ten of the core set, as against what Ceriana adds. */
  readonly isCore: boolean
  readonly answer: 'yes' | 'no' | 'not assessed'
  /** The checklist that has this answer; absent when nobody has answered yet. */
  readonly entry?: Entry<ReadinessData>
  /** Why it was not assessed, where that is the answer. */
  readonly reason?: string
}

/** Each criterion by its latest answer, in the order of the checklist. What was never asked counts as not assessed. */
export function readinessOf(record: PatientRecord): readonly Criterion[] {
  return [...listed(coreCriteria, true, record), ...listed(furtherCriteria, false, record)]
}

function listed<Name extends CriterionName>(
  labels: Readonly<Record<Name, string>>,
  isCore: boolean,
  record: PatientRecord,
): readonly Criterion[] {
  return (Object.keys(labels) as Name[]).map(name => {
    const about = { name, label: labels[name], isCore }
    const entry = record.latest(readinessChecks, data => data[name] !== undefined)
    const answer = entry?.data[name]
    if (!entry || answer === undefined) return { ...about, answer: 'not assessed' }
    const reason = reasonOf(name, entry.data)
    return { ...about, answer, entry, ...(reason === undefined ? {} : { reason }) }
  })
}

function reasonOf(name: CriterionName, data: ReadinessData): string | undefined {
  return data[`whyNot${name.charAt(0).toUpperCase()}${name.slice(1)}` as `whyNot${Capitalize<CriterionName>}`]
}

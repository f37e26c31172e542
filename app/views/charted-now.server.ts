import type { StoredEntry } from '#app/care/kind.ts'
import { findKind } from '#app/care/kinds.ts'
import type { Policy } from '#app/care/policy.ts'
import { readEntry } from '#app/care/record.ts'
import { entryWords } from '#app/rules/entry-words.ts'
import { entryWarnings } from '#app/rules/warnings.ts'
import { type ExplainedWarning, explained, whyEntry } from '#app/rules/why-warnings.ts'
import { showTime } from '#app/time/display.ts'
import { policies } from '#database/policies.server.ts'
import { contextOfAct } from './patient-care.server.ts'
import type { PatientCare } from './patient-context.server.ts'

/** What was charted a moment ago, read back, with what it asks people to do. */
export interface ChartedNow {
  readonly says: string
  readonly warnings: readonly ExplainedWarning[]
}

/** The entry that the page was led to after charting; null for any other id. */
export async function chartedNow(patient: PatientCare, id: string | null): Promise<ChartedNow | null> {
  const stored = id === null ? undefined : patient.record.entries.find(entry => entry.id === id)
  if (!stored) return null
  const { title, sentence } = entryWords(stored)
  const says = `Charted: ${showTime(stored.performedAt, patient.ward.zone)} ${title}. ${sentence}`
  return { says, warnings: warningsOf(patient, await policies(), stored) }
}

/** The warnings of an entry with why, computed as they were: with the record before it, under the policy of that moment. */
export function warningsOf(
  patient: PatientCare,
  known: readonly Policy[],
  stored: StoredEntry,
): readonly ExplainedWarning[] {
  const kind = findKind(stored.kind)
  const entry = kind && readEntry(kind, stored)[0]
  const context = contextOfAct(patient, known, stored.performedAt, stored)
  if (!kind || !entry || !context || stored.status === 'retracted') return []
  return explained(entryWarnings(kind, entry.data, context), whyEntry(kind, entry.data, context))
}

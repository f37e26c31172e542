import { expect } from 'vitest'
import { cuffPressure } from '#app/care/cuff-pressure/kind.ts'
import type { AnyCareKind, StoredEntry } from '#app/care/kind.ts'
import { type AboutContext, aContext, anEntry, aTube } from '#app/care/make.ts'
import { tubeChanges } from '#app/care/tube-change/schema.ts'
import { entryWarnings } from '#app/rules/warnings.ts'

export const PLAN = 'Follow your local emergency plan.'
const old = {
  reason: 'on arrival',
  technique: 'surgical',
  insertedOn: '2026-03-01',
  stomaMadeOn: '2026-01-05',
} as const
export const tube = anEntry(tubeChanges, '2026-03-01 10:00', aTube({ ...old, line: 'Corvane Dual' }))
export const withTube = (overrides: Parameters<typeof aTube>[0]) =>
  anEntry(tubeChanges, '2026-03-01 10:00', aTube({ ...old, line: 'Corvane Dual', ...overrides }))
export const fresh = anEntry(
  tubeChanges,
  '2026-03-07 10:00',
  aTube({ reason: 'first insertion', technique: 'percutaneous' }),
)
export const topUp = (when: string) =>
  anEntry(cuffPressure, when, { found: 15, leftAt: 24, unit: 'cmH2O', method: 'manometer' })
export type Found = readonly [
  what: string,
  kind: AnyCareKind,
  data: Readonly<Record<string, unknown>>,
  level: 'red' | 'amber' | 'blue',
  says: string,
  record?: readonly StoredEntry[],
  about?: AboutContext,
]

export const gauge = { unit: 'cmH2O', method: 'manometer' } as const
export const grade = {
  cough: 'vigorous',
  passes: 'one',
  colour: 'clear',
  viscosity: 'watery',
  interval: 'rare',
} as const

/** Holds a finding against its row: the form takes it, and it is warned of at that level, in those words. */
export function expectFound([_what, kind, data, level, says, record = [tube], about = {}]: Found): void {
  const parsed = kind.schema.safeParse(data)
  expect(parsed.error?.issues).toBeUndefined()
  const warnings = entryWarnings(kind, parsed.data, aContext(record, '12:00', about))
  const matching = warnings.filter(warning => warning.level === level && warning.action.startsWith(says))
  expect(matching.length, JSON.stringify(warnings.map(one => [one.level, one.action]))).toBeGreaterThan(0)
  if (level === 'red') expect(warnings[0]?.level).toBe('red')
}

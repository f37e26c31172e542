import type { CareContext } from '../kind.ts'
import type { Warning } from '../warning.ts'
import { spo2Fall, spo2Floor } from './settings.ts'

/** SpO2 (%) at or below which it is an emergency when it stays there: by the prescribed target, else by the floor of the policy. */
export function isFarBelow(spo2: number, { record, values }: CareContext): boolean {
  const target = record.patient.spo2Low
  return spo2 <= (target === null ? values.of(spo2Floor) : target - values.of(spo2Fall))
}

/** `, target 94 to 98%`, or nothing where none is prescribed. */
export function targetWords({ record: { patient } }: CareContext): string {
  if (patient.spo2Low === null) return ''
  return patient.spo2High === null
    ? `, target at least ${patient.spo2Low}%`
    : `, target ${patient.spo2Low} to ${patient.spo2High}%`
}

/** SpO2 that fell far, with nothing charted of where it settled: amber, since it may be the emergency. */
export function lowSaturation(
  name: string,
  { spo2Low, spo2After }: { readonly spo2Low?: number | undefined; readonly spo2After?: number | undefined },
  context: CareContext,
): readonly Warning[] {
  if (spo2Low === undefined || spo2After !== undefined || !isFarBelow(spo2Low, context)) return []
  return [
    {
      name,
      level: 'amber',
      action: 'Stay until SpO2 is back within target. If it does not come back, call for help.',
      cause: `SpO2 fell to ${spo2Low}%${targetWords(context)}; where it settled is not charted.`,
      source: spo2Fall.source.says,
    },
  ]
}

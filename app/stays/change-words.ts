import { showDateTime } from '../time/display.ts'
import type { Zone } from '../time/zone.ts'

/** A change of what is known of a patient or a stay, in words. */
export interface ChangeView {
  readonly key: string
  readonly when: string
  readonly who: string
  readonly what: string
  readonly details: readonly string[]
}

const labels: Readonly<Record<string, string>> = {
  recordNumber: 'Record number',
  familyName: 'Family name',
  givenName: 'Given name',
  bornOn: 'Date of birth',
  sex: 'Sex',
  allergies: 'Allergies',
  upperAirway: 'Upper airway',
  laryngoscopy: 'View at laryngoscopy',
  airwayNotes: 'Known problems of the airway',
  ventilated: 'Ventilation through the tube',
  oxygen: 'Oxygen',
  spo2Low: 'SpO2 target from',
  spo2High: 'SpO2 target to',
  dischargeReason: 'Destination',
  dischargeNote: 'Note',
}

/** Each change with the old and the new words; ids, which mean nothing to people, are left out. */
export function changeViews(
  changes: readonly {
    readonly what: string
    readonly changedAt: Date
    readonly changedByName: string
    readonly oldValues: Readonly<Record<string, unknown>> | null
    readonly newValues: Readonly<Record<string, unknown>>
  }[],
  zone: Zone,
): readonly ChangeView[] {
  return changes.map(({ what, changedAt, changedByName, oldValues, newValues }, index) => ({
    key: String(index),
    when: showDateTime(changedAt, zone),
    who: changedByName,
    what: what.charAt(0).toUpperCase() + what.slice(1),
    details: Object.entries(labels).flatMap(([name, label]) =>
      name in newValues && oldValues !== null
        ? [`${label}: ${shown(oldValues[name])}, now ${shown(newValues[name])}`]
        : [],
    ),
  }))
}

function shown(value: unknown): string {
  if (value === null || value === undefined || value === '') return 'not recorded'
  if (typeof value === 'string') return value
  if (typeof value === 'boolean') return value ? 'yes' : 'no'
  return typeof value === 'number' ? String(value) : JSON.stringify(value)
}

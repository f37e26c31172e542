import type { PressureUnit } from '../clinical/units.ts'
import type { ShiftTimes } from '../time/shift.ts'
import type { LocalDay, Zone } from '../time/zone.ts'
import type { Recall } from './recall.ts'

/** What rules may know of the person, apart from entries. */
export interface PatientFacts {
  readonly bornOn: LocalDay
  readonly upperAirway: 'open' | 'not open' | 'not known'
  readonly ventilated: boolean
  /** Prescribed SpO2 target in %, null when none is recorded. */
  readonly spo2Low: number | null
  readonly spo2High: number | null
  /** View at laryngoscopy by its grade, and what is known to be difficult; absent or null when nobody has said. */
  readonly laryngoscopy?: '1' | '2' | '3' | '4' | null
  readonly airwayNotes?: string | null
  /** Bed, and name, birth and number, as the sign over the bed gives them; absent where the stay is not at hand. */
  readonly bed?: string
  readonly identity?: string
}

/** The patient came to another bed. */
export interface BedMove {
  readonly at: Date
  readonly bed: string
  /** The ward, where it led to another one; null within a ward. */
  readonly ward: string | null
}

/** What rules may know of the ward. */
export interface WardFacts {
  readonly zone: Zone
  readonly shiftTimes: ShiftTimes
  readonly pressureUnit: PressureUnit
  /** Lots that nobody is to use any more. */
  readonly recalls?: readonly Recall[]
}

import type { Role } from '#app/auth/permissions.ts'
import type { EmergencyNumber } from '#app/care/emergency.ts'
import type { PatientFacts, StoredEntry } from '#app/care/kind.ts'
import type { Policy } from '#app/care/policy.ts'
import type { StockItem } from '#app/catalogue/identify.ts'
import type { Catalogue } from '#app/catalogue/known-items.ts'
import type { PressureUnit } from '#app/clinical/units.ts'
import type { LocalDay, Zone } from '#app/time/zone.ts'
import type { DemoSignOff } from './competences.ts'

/** The demo hospital as plain rows: what is loaded, and what tests run the rules over. Moments are UTC. */
export interface DemoHospital {
  readonly seededAt: Date
  readonly zone: Zone
  readonly wards: readonly DemoWard[]
  readonly beds: readonly DemoBed[]
  readonly people: readonly DemoPerson[]
  readonly signOffs: readonly DemoSignOff[]
  readonly patients: readonly DemoPatient[]
  readonly stays: readonly DemoStay[]
  readonly moves: readonly DemoMove[]
  readonly changes: readonly DemoChange[]
  readonly policies: readonly DemoPolicy[]
  readonly catalogue: Catalogue
  readonly entries: readonly DemoEntry[]
  readonly stockMoves: readonly DemoStockMove[]
}

export interface DemoWard {
  readonly id: string
  readonly name: string
  readonly shiftTimes: readonly string[]
  readonly pressureUnit: PressureUnit
  readonly emergencyNumbers: readonly EmergencyNumber[]
}

export interface DemoBed {
  readonly id: string
  readonly wardId: string
  readonly label: string
  readonly position: number
}

export interface DemoPerson {
  readonly id: string
  readonly name: string
  readonly email: string
  readonly role: Role
  readonly supervised: boolean
  readonly wardIds: readonly string[]
  readonly addedAt: Date
}

export interface DemoPatient extends PatientFacts {
  readonly id: string
  readonly recordNumber: string
  readonly familyName: string
  readonly givenName: string
  readonly bornOn: LocalDay
  readonly sex: 'female' | 'male' | 'other' | 'not known'
  readonly allergies: string | null
  readonly oxygen: string | null
}

export interface DemoStay {
  readonly id: string
  readonly patientId: string
  readonly wardId: string
  readonly bedId: string
  readonly admittedAt: Date
  readonly dischargedAt: Date | null
  readonly dischargeReason: string | null
  readonly dischargeNote: string | null
}

/** A patient came to a bed: on admission, or from another bed. */
export interface DemoMove {
  readonly id: string
  readonly stayId: string
  readonly wardId: string
  readonly bedId: string
  readonly movedAt: Date
  readonly recordedBy: string
}

/** Who changed what of a patient or a stay. */
export interface DemoChange {
  readonly subject: 'patient' | 'stay'
  readonly subjectId: string
  readonly what: string
  readonly changedBy: string
  readonly changedAt: Date
  readonly oldValues: Readonly<Record<string, unknown>> | null
  readonly newValues: Readonly<Record<string, unknown>>
}

export interface DemoPolicy extends Policy {
  readonly reason: string
  readonly createdBy: string
}

/** An entry as it is read back, with the id of its witness, by which it is written. */
export interface DemoEntry extends StoredEntry {
  readonly witnessId: string | null
}

/** What came to a place of a ward or left it; the stock is the sum. */
export interface DemoStockMove {
  readonly actId: string
  readonly part: number
  readonly act: string
  readonly wardId: string
  readonly bedId: string | null
  readonly item: StockItem
  readonly quantity: number
  readonly counted: number | null
  readonly entryId: string | null
  readonly stayId: string | null
  readonly movedAt: Date
  readonly recordedAt: Date
  readonly recordedBy: string
  readonly reason: string | null
}

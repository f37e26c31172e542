import { instantsOf } from '../time/zone.ts'
import type { Clock, DueWindow } from './clock.ts'
import { decannulations } from './decannulation/schema.ts'
import type {
  AnyCareKind,
  AnyCharted,
  BedMove,
  CareContext,
  DataOf,
  PatientFacts,
  StoredEntry,
  WardFacts,
} from './kind.ts'
import { versionOf } from './payload.ts'
import { type PersonalValue, type Policy, type SettingValue, valuesFor } from './policy.ts'
import { patientRecord } from './record.ts'
import type { TubeData } from './tube-change/schema.ts'

/** Builders for tests: the smallest valid thing, with what the test is about laid over it. Zone Europe/London. */

const TODAY = '2026-03-10' // winter time: the wall clock in London shows UTC

const ward: WardFacts = {
  zone: 'Europe/London',
  shiftTimes: ['07:00', '15:00', '23:00'],
  pressureUnit: 'cmH2O',
}

const patient: PatientFacts = {
  bornOn: '1958-04-17',
  upperAirway: 'open',
  ventilated: false,
  spo2Low: null,
  spo2High: null,
}

/** A moment on the ward's wall clock: '14:06' on 10-Mar-2026, or '2026-03-29 07:00'. Throws when clocks show it twice or never. */
export function at(when: string): Date {
  const [day, time] = when.includes(' ') ? (when.split(' ') as [string, string]) : [TODAY, when]
  const instants = instantsOf(day, time, ward.zone)
  if (instants.kind !== 'one') throw new RangeError(`${when} is not one moment in ${ward.zone}`)
  return instants.at
}

let made = 0

/** A stored entry of a kind, performed and recorded at `when`; `more` sets the rest of its spine. Throws when the kind would refuse `data`. */
export function anEntry<K extends AnyCharted>(
  kind: K,
  when: string | Date,
  data: DataOf<K>,
  more: Partial<StoredEntry> = {},
): StoredEntry {
  made += 1
  const performedAt = typeof when === 'string' ? at(when) : when
  return {
    id: `entry-${String(made).padStart(6, '0')}`,
    stayId: 'stay-1',
    number: made,
    kind: kind.slug,
    performedAt,
    recordedAt: performedAt,
    recordedById: 'user-1',
    recordedByName: 'Ama Mensah',
    recordedRole: 'nurse',
    witnessName: null,
    supersedesId: null,
    reason: null,
    status: 'final',
    version: versionOf(kind),
    raw: kind.schema.parse(data),
    ...more,
  }
}

/** An entry that supersedes another one: a correction, or with `status: 'retracted'` a retraction. */
export function aCorrection<K extends AnyCharted>(
  of: StoredEntry,
  kind: K,
  when: string | Date,
  data: DataOf<K>,
  more: Partial<StoredEntry> = {},
): StoredEntry {
  return anEntry(kind, when, data, { supersedesId: of.id, reason: 'Charted in error', ...more })
}

/** The tube taken out for good at `when`. */
export function aRemoval(when: string): StoredEntry {
  const agreed = { agreed: 'yes', operator: 'M. Osei', helper: 'T. Okafor' } as const
  return anEntry(decannulations, when, { ...agreed, kit: 'complete', breathing: 'comfortable', dressing: 'yes' })
}

/** What a context says apart from its entries and its moment. */
export interface AboutContext {
  readonly admittedAt?: string
  /** Moves to another bed. */
  readonly moves?: readonly BedMove[]
  readonly patient?: Partial<PatientFacts>
  readonly ward?: Partial<WardFacts>
  /** Values of the ward's policy by setting name. */
  readonly policy?: Readonly<Record<string, SettingValue>>
  /** The patient's own values by setting name. */
  readonly personal?: Readonly<Record<string, number>>
}

/** Everything a rule decides from, at `now`, with these entries stored. Admitted 01-Mar-2026 08:00 unless said. */
export function aContext(entries: readonly StoredEntry[], now: string | Date, about: AboutContext = {}): CareContext {
  return {
    record: patientRecord(entries, {
      admittedAt: at(about.admittedAt ?? '2026-03-01 08:00'),
      moves: about.moves ?? [],
      patient: { ...patient, ...about.patient },
    }),
    values: valuesFor(aPolicy(about.policy), Object.entries(about.personal ?? {}).map(aPersonalValue)),
    ward: { ...ward, ...about.ward },
    now: typeof now === 'string' ? at(now) : now,
  }
}

/** A policy reviewed and in force since the start of the year. */
export function aPolicy(values: Readonly<Record<string, SettingValue>> = {}): Policy {
  return {
    id: 'policy-1',
    name: 'Tracheostomy care',
    version: 1,
    wardId: null,
    reviewedBy: 'M. Osei',
    reviewedOn: '2026-01-02',
    startsAt: at('2026-01-05 00:00'),
    values,
  }
}

function aPersonalValue([setting, value]: readonly [string, number]): PersonalValue {
  return {
    setting,
    value,
    reason: 'As agreed on the round',
    reviewOn: '2026-03-20',
    since: at('2026-03-01 09:00'),
    by: 'M. Osei',
  }
}

/** A tube put in: cuffed, dual, with a disposable inner cannula, unless `overrides` say otherwise. A key set to undefined is left out. */
export function aTube(overrides: { readonly [Name in keyof TubeData]?: TubeData[Name] | undefined } = {}): TubeData {
  const tube: TubeData = {
    reason: 'routine',
    line: 'Alder',
    sizeSystem: 'ISO 5366',
    size: '8.0',
    idWithInner: 8,
    idWithoutInner: 9.1,
    od: 11.8,
    lengthMm: 81,
    cuff: 'air',
    construction: 'dual',
    innerCannula: 'disposable',
    fenestrated: 'no',
    connector: 'outer',
    flange: 'fixed',
    sutures: 'none',
    operator: 'M. Osei',
    difficulty: 'easy',
    position: 'capnography',
  }
  const laid = Object.entries({ ...tube, ...overrides }).filter(([, value]) => value !== undefined)
  return Object.fromEntries(laid) as TubeData
}

/** What the clock of a kind's task says, by the name of the task. Throws when the kind has no such task. */
export function clockOf(kind: AnyCareKind, task: string, context: CareContext): Clock {
  const rule = kind.tasks?.find(({ name }) => name === task)
  if (!rule) throw new RangeError(`${kind.slug} has no task ${task}`)
  return rule.clock(context)
}

/** The window of a task that runs. Throws when it is suspended or does not apply. */
export function windowOf(kind: AnyCareKind, task: string, context: CareContext): DueWindow {
  const clock = clockOf(kind, task, context)
  if (clock.state !== 'running') throw new RangeError(`${task} does not run: ${clock.state}`)
  return clock.window
}

import { tubeChanges } from '#app/care/tube-change/schema.ts'
import { earlier, hours } from '#app/time/duration.ts'
import { alderStories } from '#database/seeders/alder.ts'
import { bedsideOf, type Place } from '#database/seeders/bedside.ts'
import { birchStories } from '#database/seeders/birch.ts'
import { demoCatalogue } from '#database/seeders/catalogue.ts'
import { cedarStories } from '#database/seeders/cedar.ts'
import { entriesOf } from '#database/seeders/entries.ts'
import type { Rota } from '#database/seeders/people.ts'
import { demoPolicies } from '#database/seeders/policies.ts'
import { idAt, randomFrom } from '#database/seeders/random.ts'
import type { DemoBed, DemoEntry, DemoHospital, DemoPatient, DemoPerson, DemoStay } from '#database/seeders/rows.ts'
import type { BedStory, FirstTube } from '#database/seeders/story.ts'
import type { WardWithBeds } from '#database/seeders/wards.ts'
import { largeCatalogue } from './catalogue.ts'

const ZONE = 'Europe/London'
const PATIENTS_A_WARD = 40
const DAYS = 330 // of routine care: more than enough entries

const WARDS = 15
const ENTRIES_EACH = 2500

/** A hospital whose first ward has its entries; `copies` says which stay of that ward every other stay repeats. */
export interface BenchHospital {
  readonly hospital: DemoHospital
  readonly nurse: DemoPerson
  readonly copies: readonly { readonly original: string; readonly stayId: string }[]
}

/** 600 patients on 15 wards with 1.5 M entries up to `now`. The same in every run, but for the moment it ends at. */
export function largeHospital(now: Date): BenchHospital {
  const openedAt = earlier(now, hours((DAYS + 20) * 24))
  const wards = Array.from({ length: WARDS }, (_, index) => ward(index + 1, openedAt))
  const [first, ...rest] = wards
  const people = first ? staff(first, openedAt) : []
  const [nurse, author] = [people[0], people.at(-1)]
  if (!first || !nurse || !author) throw new RangeError('A hospital has a ward with people')
  const charts = first.beds.map((bed, index) => bedWithEntries({ ward: first, bed }, index, people, now))
  const others = rest.flatMap(({ beds }) => beds.map((bed, index) => copied(bed, nth(charts, index), openedAt)))
  return {
    hospital: {
      seededAt: now,
      zone: ZONE,
      wards: wards.map(({ row }) => row),
      beds: wards.flatMap(({ beds }) => beds),
      people,
      signOffs: [],
      patients: [...charts, ...others].map(({ patient }) => patient),
      stays: [...charts, ...others].map(({ stay }) => stay),
      moves: [],
      changes: [],
      catalogue: largeCatalogue(),
      policies: demoPolicies(now, ZONE, [first], author),
      entries: charts.flatMap(({ entries }) => latest(entries, ENTRIES_EACH)),
      stockMoves: [],
    },
    nurse,
    copies: others.map(({ original, stay }) => ({ original, stayId: stay.id })),
  }
}

/** The first ward alone, with the last 250 entries of each patient: 10 thousand, and the same board. */
export function smallHospital({ hospital, nurse }: BenchHospital): BenchHospital {
  const wards = hospital.wards.slice(0, 1)
  const isThere = ({ wardId }: { wardId: string }) => wardId === wards[0]?.id
  const stays = hospital.stays.filter(isThere)
  return {
    hospital: {
      ...hospital,
      wards,
      stays,
      catalogue: demoCatalogue,
      beds: hospital.beds.filter(isThere),
      patients: hospital.patients.slice(0, stays.length),
      entries: stays.flatMap(({ id }) =>
        latest(
          hospital.entries.filter(({ stayId }) => stayId === id),
          ENTRIES_EACH / 10,
        ),
      ),
    },
    nurse,
    copies: [],
  }
}

function ward(number: number, openedAt: Date): WardWithBeds {
  const random = randomFrom(`ward ${number}`)
  const id = idAt(openedAt, random)
  const name = number === 1 ? 'Alder ward' : (`Ward ${number}` as 'Alder ward')
  const beds = Array.from({ length: PATIENTS_A_WARD }, (_, index) => {
    return { id: idAt(openedAt, random), wardId: id, label: `${index + 1}`, position: index + 1 }
  })
  return {
    row: { id, name, shiftTimes: ['07:00', '15:00', '23:00'], pressureUnit: 'cmH2O', emergencyNumbers: [] },
    beds,
    cuffUpperLimit: undefined,
  }
}

const ROLES = [
  ...Array<'nurse'>(12).fill('nurse'),
  'charge nurse',
  'respiratory therapist',
  'tracheostomy specialist',
] as const

function staff({ row }: WardWithBeds, addedAt: Date): readonly DemoPerson[] {
  const random = randomFrom('people')
  return ROLES.map((role, index) => {
    const name = `Person Number ${index + 1}`
    return {
      id: idAt(addedAt, random),
      name,
      email: `person${index + 1}@ward.example`,
      role,
      supervised: false,
      wardIds: [row.id],
      addedAt,
    }
  })
}

function rotaOf(people: readonly DemoPerson[]): Rota {
  const nurses = people.filter(({ role }) => role === 'nurse')
  return {
    nurse: (_ward, bed, at) => nth(nurses, bed.position + Math.floor(at.getTime() / hours(8))),
    lead: (_ward, role) =>
      nth(
        people.filter(person => person.role === role),
        0,
      ),
  }
}

/** The stories of the demo hospital in turn, those with a tube in place, without what makes each of them special. */
const usual = [...alderStories, ...birchStories, ...cedarStories].filter(
  (story): story is BedStory & { tube: FirstTube } =>
    story.tube !== undefined && story.discharged === undefined && story.removedHoursAgo === undefined,
)

function bedWithEntries(place: Place, index: number, people: readonly DemoPerson[], now: Date) {
  const random = randomFrom(`bed ${index + 1}`)
  const { patient: person, tube, secretions, stands } = nth(usual, index)
  const since = 'hoursAgo' in tube.inserted ? tube.inserted.hoursAgo : tube.inserted.daysAgo * 24
  const story: BedStory = {
    bed: place.bed.label,
    patient: { ...person, recordNumber: place.bed.id.slice(-12) },
    admittedHoursAgo: DAYS * 24,
    tube: { name: tube.name, inserted: { daysAgo: DAYS + 4, stomaDaysAgo: DAYS + 9 }, technique: tube.technique },
    change: { name: tube.name, hoursAgo: since, reason: 'routine' },
    secretions,
    stands,
  }
  const bedside = bedsideOf(story, { now, zone: ZONE, random, rota: rotaOf(people), placeOf: () => place })
  const patient: DemoPatient = { id: idAt(bedside.admittedAt, random), ...story.patient }
  const stay = stayIn(place.bed, patient.id, idAt(bedside.admittedAt, random), bedside.admittedAt)
  return { patient, stay, entries: entriesOf(bedside, stay.id) }
}

/** Another patient with the chart of one who has one. */
function copied(bed: DemoBed, like: ReturnType<typeof bedWithEntries>, openedAt: Date) {
  const random = randomFrom(`copy ${bed.id}`)
  const patient = { ...like.patient, id: idAt(openedAt, random), recordNumber: bed.id.slice(-12) }
  return {
    patient,
    stay: stayIn(bed, patient.id, idAt(openedAt, random), like.stay.admittedAt),
    original: like.stay.id,
  }
}

function stayIn({ id: bedId, wardId }: DemoBed, patientId: string, id: string, admittedAt: Date): DemoStay {
  return { id, patientId, wardId, bedId, admittedAt, dischargedAt: null, dischargeReason: null, dischargeNote: null }
}

/** The tubes and the latest of the rest, so that charts of any length show the same board. */
function latest(entries: readonly DemoEntry[], count: number): readonly DemoEntry[] {
  const tubes = entries.filter(({ kind }) => kind === tubeChanges.slug)
  const others = entries.filter(({ kind }) => kind !== tubeChanges.slug)
  if (entries.length < count) throw new RangeError(`A stay of ${DAYS} days has only ${entries.length} entries`)
  return [...tubes, ...others.slice(tubes.length - count)]
    .toSorted((a, b) => a.number - b.number)
    .map((entry, index) => ({ ...entry, number: index + 1 }))
}

/** An item of a list by its number, from the start again after the last. */
function nth<T>(list: readonly T[], number: number): T {
  const item = list[number % list.length]
  if (item === undefined) throw new RangeError('The list is empty')
  return item
}

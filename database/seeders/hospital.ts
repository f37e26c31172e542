import type { Zone } from '#app/time/zone.ts'
import { alderStories } from './alder.ts'
import { type Bedside, bedsideOf, hoursBefore, type Place } from './bedside.ts'
import { birchStories } from './birch.ts'
import { demoCatalogue } from './catalogue.ts'
import { cedarStories } from './cedar.ts'
import { changesOf, onDuty } from './changes.ts'
import { demoSignOffs } from './competences.ts'
import { entriesOf } from './entries.ts'
import { demoPeople, rotaOf } from './people.ts'
import { demoPolicies } from './policies.ts'
import { idAt, type Random, randomFrom } from './random.ts'
import type { DemoHospital, DemoMove, DemoPatient, DemoPerson, DemoStay } from './rows.ts'
import type { BedStory } from './story.ts'
import { withStudents } from './students.ts'
import { demoStock } from './supplies.ts'
import { bedLabelled, demoWards, type WardWithBeds } from './wards.ts'

const stories: readonly BedStory[] = [...alderStories, ...birchStories, ...cedarStories]

/**
 * The demo hospital as it stands at a moment: three wards, their people, policies and patients, and some days of charting
 * that end then. The same moment and zone give the same rows, ids included.
 */
export function demoHospital(now: Date, zone: Zone): DemoHospital {
  const wards = demoWards(now)
  const people = demoPeople(now, wards)
  const rota = rotaOf(people, zone)
  const placeOf = (label: string): Place => placeLabelled(wards, label)
  const stays = stories.map(story => {
    const random = randomFrom(`${story.bed} ${story.patient.recordNumber} ${now.getTime()}`)
    return stayOf(bedsideOf(story, { now, zone, random, rota, placeOf }), random)
  })
  const hospital = {
    seededAt: now,
    zone,
    wards: wards.map(ward => ward.row),
    beds: wards.flatMap(ward => ward.beds),
    people,
    signOffs: demoSignOffs(people, now, zone),
    patients: stays.map(({ patient }) => patient),
    stays: stays.map(({ stay }) => stay),
    moves: stays.flatMap(({ moves }) => moves),
    changes: stays.flatMap(({ changes }) => changes).toSorted((a, b) => a.changedAt.getTime() - b.changedAt.getTime()),
    catalogue: demoCatalogue,
    policies: demoPolicies(now, zone, wards, specialistOf(people)),
    entries: withStudents(
      stays.flatMap(({ entries }) => entries),
      people,
      stays.map(({ stay }) => stay),
      now,
    ),
  }
  return { ...hospital, stockMoves: demoStock(hospital) }
}

function stayOf(bedside: Bedside, random: Random) {
  const { story, now, place, earlierPlace, admittedAt } = bedside
  const patient: DemoPatient = { id: idAt(admittedAt, random), ...story.patient }
  const stay: DemoStay = {
    id: idAt(admittedAt, random),
    patientId: patient.id,
    wardId: place.ward.row.id,
    bedId: place.bed.id,
    admittedAt,
    dischargedAt: story.discharged ? hoursBefore(now, story.discharged.hoursAgo) : null,
    dischargeReason: story.discharged?.reason ?? null,
    dischargeNote: story.discharged?.note ?? null,
  }
  // The first move is the admission and has its id.
  const moves = [
    moveTo(earlierPlace ?? place, admittedAt, stay.id),
    ...(earlierPlace ? [moveTo(place, earlierPlace.until, idAt(earlierPlace.until, random))] : []),
  ]
  const changes = changesOf(bedside, { patient, stay, moves })
  return { patient, stay, moves, changes, entries: entriesOf(bedside, stay.id) }

  function moveTo(to: Place, movedAt: Date, id: string): DemoMove {
    const { ward, bed } = to
    const recordedBy = onDuty(bedside, to, movedAt)
    return { id, stayId: stay.id, wardId: ward.row.id, bedId: bed.id, movedAt, recordedBy }
  }
}

function placeLabelled(wards: readonly WardWithBeds[], label: string): Place {
  const bed = bedLabelled(wards, label)
  const ward = wards.find(other => other.row.id === bed.wardId)
  if (!ward) throw new RangeError(`Bed ${label} belongs to no ward`)
  return { ward, bed }
}

function specialistOf(people: readonly DemoPerson[]): DemoPerson {
  const specialist = people.find(({ role }) => role === 'tracheostomy specialist')
  if (!specialist) throw new RangeError('The demo hospital has no tracheostomy specialist')
  return specialist
}

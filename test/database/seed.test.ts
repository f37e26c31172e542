import { expect, test } from 'vitest'
import { roles } from '#app/auth/permissions.ts'
import { carePlan } from '#app/care/care-plan/kind.ts'
import { cuffState } from '#app/care/cuff-pressure/cuff.ts'
import { deferral } from '#app/care/deferral/kind.ts'
import type { CareContext } from '#app/care/kind.ts'
import { careSettings, findKind } from '#app/care/kinds.ts'
import { readPayload } from '#app/care/payload.ts'
import { suturesIn } from '#app/care/tube-change/tasks.ts'
import { dwellLimit, insertedOn, isFirstTube, tubeInPlace } from '#app/care/tube-change/tube.ts'
import { daysLeft } from '#app/clinical/dwell.ts'
import { standingWarnings } from '#app/rules/warnings.ts'
import { hours, since } from '#app/time/duration.ts'
import { localDay } from '#app/time/zone.ts'
import { demoHospital } from '#database/seeders/hospital.ts'
import { contextOf, present, standings } from '#test/demo-hospital.ts'

const LONDON = 'Europe/London'
const hospital = demoHospital(new Date('2026-12-01T14:06:00Z'), LONDON)
const stays = hospital.stays.filter(stay => stay.dischargedAt === null)
const contexts = stays.map(stay => contextOf(hospital, stay))
const tubeOf = ({ record }: CareContext) => tubeInPlace(record)?.data

test('the same moment gives the same hospital, ids included', () => {
  expect(demoHospital(new Date('2026-12-01T14:06:00Z'), LONDON)).toEqual(hospital)
})

test('another moment gives other ids', () => {
  const ids = new Set(hospital.entries.map(({ id }) => id))
  const other = demoHospital(new Date('2026-12-01T14:07:00Z'), LONDON)
  expect(other.entries.filter(({ id }) => ids.has(id))).toEqual([])
})

test('every id is used once, has the form of a UUIDv7, and sorts by its time', () => {
  const { wards, beds, people, patients, policies, entries } = hospital
  const ids = [wards, beds, people, patients, policies, entries].flatMap(rows => rows.map(({ id }) => id))
  expect(new Set(ids).size).toBe(ids.length)
  expect(ids.filter(id => !/^[\da-f]{8}-[\da-f]{4}-7[\da-f]{3}-[89ab][\da-f]{3}-[\da-f]{12}$/.test(id))).toEqual([])
  const plain = entries.filter(({ supersedesId }) => supersedesId === null)
  const byTime = plain.toSorted((a, b) => a.performedAt.getTime() - b.performedAt.getTime())
  expect(plain.map(({ id }) => id.slice(0, 13)).toSorted()).toEqual(byTime.map(({ id }) => id.slice(0, 13)))
})

test('every payload passes the schema of its kind', () => {
  const unread = hospital.entries.flatMap(({ kind, version, raw, id }) => {
    const known = findKind(kind)
    const read = known ? readPayload(known, version, raw) : { ok: false as const, why: 'no such kind' }
    return read.ok ? [] : [`${kind} ${id}: ${read.why}`]
  })
  expect(unread).toEqual([])
})

test('nothing was charted before it happened or after the moment of seeding', () => {
  const { entries, seededAt } = hospital
  expect(entries.filter(entry => entry.recordedAt < entry.performedAt || entry.recordedAt > seededAt)).toEqual([])
})

test('entries of a stay are numbered without gaps in the order of recording, within the stay', () => {
  for (const { id, admittedAt, dischargedAt } of hospital.stays) {
    const own = hospital.entries.filter(({ stayId }) => stayId === id)
    expect(own.map(({ number }) => number)).toEqual(own.map((_, index) => index + 1))
    expect(own.map(({ recordedAt }) => recordedAt)).toEqual(own.map(entry => entry.recordedAt).toSorted(byTime))
    expect(own.filter(({ performedAt: at }) => at < admittedAt || (dischargedAt && at > dischargedAt))).toEqual([])
  }
})

const byTime = (a: Date, b: Date) => a.getTime() - b.getTime()

test.each(roles)('somebody is %s', role => {
  expect(hospital.people.filter(person => person.role === role).length).toBeGreaterThan(0)
})

test('three wards hold 8 to 14 patients each, one of them with gauges in mmHg and one with two shifts a day', () => {
  expect(hospital.wards.map(({ name }) => present(hospital, name).length)).toEqual([13, 10, 9])
  expect(hospital.wards.filter(({ pressureUnit }) => pressureUnit === 'mmHg')).toHaveLength(1)
  expect(hospital.wards.filter(({ shiftTimes }) => shiftTimes.length === 2)).toHaveLength(1)
})

test('the policy of the hospital has every setting, and one ward keeps cuffs lower', () => {
  const [general, own] = hospital.policies
  expect(Object.keys(general?.values ?? {})).toEqual(careSettings.map(({ name }) => name))
  expect(general?.wardId).toBeNull()
  expect(own?.values['cuff-pressure-upper-limit']).toBe(25)
  expect(hospital.policies.map(({ reviewedBy }) => reviewedBy)).not.toContain('')
})

/** Moments at which boards look different: start of a shift, night, both changes of clocks, seconds, turn of the year, far away. */
const moments = [
  ['2026-12-01T14:06:00Z', LONDON],
  ['2026-12-01T07:01:00Z', LONDON],
  ['2026-12-01T23:05:00Z', LONDON],
  ['2026-03-29T03:30:00Z', LONDON],
  ['2026-10-25T01:40:00Z', LONDON],
  ['2027-01-01T00:00:30.250Z', 'America/St_Johns'],
  ['2026-04-04T15:31:00Z', 'Australia/Lord_Howe'],
] as const

test.each(moments)(
  'at %s in %s every board shows care done, due, late and seriously late, and most of it in time',
  (now, zone) => {
    const then = demoHospital(new Date(now), zone)
    for (const { name } of then.wards) {
      const counts = standings(then, name)
      const late = (counts.overdue ?? 0) + (counts['seriously overdue'] ?? 0)
      expect(counts.due, `${name}: due`).toBeGreaterThanOrEqual(5)
      expect(counts['due soon'], `${name}: due soon`).toBeGreaterThanOrEqual(2)
      expect(counts.overdue, `${name}: overdue`).toBeGreaterThanOrEqual(3)
      expect([1, 2], `${name}: seriously overdue`).toContain(counts['seriously overdue'])
      expect(counts.upcoming, `${name}: done in time`).toBeGreaterThan(3 * late)
    }
  },
)

test('some readings of the last twelve hours were found out of range on each ward', () => {
  for (const { name } of hospital.wards) {
    const marked = present(hospital, name).flatMap(stay => {
      const context = contextOf(hospital, stay)
      const recent = hospital.entries.filter(({ stayId, performedAt }) => {
        return stayId === stay.id && since(performedAt, hospital.seededAt) < hours(12)
      })
      return recent.filter(({ kind, raw }) => findKind(kind)?.outOfRange?.(raw, context))
    })
    expect(marked.length, name).toBeGreaterThan(0)
  }
})

test('nobody is in an emergency', () => {
  const red = contexts.flatMap(context => standingWarnings(context).filter(({ level }) => level === 'red'))
  expect(red).toEqual([])
})

const leftOf = (context: CareContext): number | undefined => {
  const tube = tubeInPlace(context.record)
  const today = localDay(context.now, LONDON)
  return tube && daysLeft(insertedOn(tube, context), dwellLimit(tube, context).days, today)
}

const isNew = (context: CareContext): boolean => {
  const tube = tubeInPlace(context.record)
  return tube !== undefined && isFirstTube(tube) && since(tube.performedAt, context.now) < hours(48)
}

test.each<[string, (context: CareContext) => boolean]>([
  ['a tube near its limit', context => leftOf(context) === 2],
  ['a tube past its limit', context => (leftOf(context) ?? 0) < 0],
  ['a laryngectomy', ({ record }) => record.patient.upperAirway === 'not open'],
  ['an opening without a tube', ({ record }) => record.patient.upperAirway === 'not open' && !tubeInPlace(record)],
  ['an uncuffed tube', context => tubeOf(context)?.cuff === 'none'],
  ['a single cannula', context => tubeOf(context)?.construction === 'single'],
  ['a water cuff', context => tubeOf(context)?.cuff === 'water'],
  ['a cuff that is down', ({ record }) => cuffState(record) === 'deflated'],
  ['reusable inner cannulas', context => tubeOf(context)?.innerCannula === 'reusable'],
  ['a fenestrated tube', context => tubeOf(context)?.fenestrated === 'yes'],
  ['an adjustable flange', context => tubeOf(context)?.flange === 'adjustable'],
  ['a tube whose label allows 29 days', context => tubeOf(context)?.longestUseDays === 29],
  ['a tube in its first 48 hours', isNew],
  [
    'a fresh percutaneous tube with sutures',
    context => tubeOf(context)?.technique === 'percutaneous' && suturesIn(context),
  ],
  ['a tube taken out for good', ({ record }) => record.patient.upperAirway === 'open' && !tubeInPlace(record)],
  ['somebody ventilated', ({ record }) => record.patient.ventilated],
  ['a deferral', ({ record }) => record.latest(deferral) !== undefined],
  ['a care plan', ({ record }) => record.latest(carePlan) !== undefined],
])('somebody on a board has %s', (_, holds) => {
  expect(contexts.filter(holds).length).toBeGreaterThan(0)
})

test('there are a correction, a retraction, entries written late, and one so late that it has a reason', () => {
  const { entries } = hospital
  const corrected = entries.filter(entry => entry.supersedesId && entry.status === 'final')
  const retracted = entries.filter(({ status }) => status === 'retracted')
  const late = entries.filter(entry => since(entry.performedAt, entry.recordedAt) > hours(1))
  const veryLate = late.filter(entry => since(entry.performedAt, entry.recordedAt) > hours(24))
  expect([corrected, retracted].flat().filter(({ reason }) => !reason)).toEqual([])
  expect([corrected.length, retracted.length, late.length].filter(count => count === 0)).toEqual([])
  expect(veryLate.length).toBeGreaterThan(0)
  expect(veryLate.filter(({ reason }) => !reason)).toEqual([])
})

test('one stay has ended, and one patient came from another ward', () => {
  expect(hospital.stays.filter(({ dischargedAt }) => dischargedAt !== null)).toHaveLength(1)
  const moved = hospital.moves.filter(move => hospital.stays.every(({ id }) => id !== move.id))
  expect(moved.map(({ stayId }) => hospital.moves.filter(move => move.stayId === stayId).length)).toEqual([2])
})

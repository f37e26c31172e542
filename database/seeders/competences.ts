import type { Level, Skill } from '#app/care/skills.ts'
import type { LocalDay } from '#app/time/zone.ts'
import { addDays, localDay, startOfDay, type Zone } from '#app/time/zone.ts'
import { idAt, type Random, randomFrom } from './random.ts'
import type { DemoPerson } from './rows.ts'

/** A sign-off of the demo hospital. */
export interface DemoSignOff {
  readonly id: string
  readonly userId: string
  readonly skill: Skill
  readonly level: Level
  readonly assessedOn: LocalDay
  readonly expiresOn: LocalDay
  readonly assessedBy: DemoPerson
  readonly signedAt: Date
}

const YEAR = 365

/** How long ago each nurse of a ward was assessed, in days, in turn: some ran out, one runs out soon, one never was. */
const nursesAgo = [60, YEAR - 12, 200, YEAR + 40, null, 120] as const

/** Sign-offs by the educator and the specialist, with gaps as a ward has them. */
export function demoSignOffs(people: readonly DemoPerson[], now: Date, zone: Zone): readonly DemoSignOff[] {
  const random = randomFrom(`competences ${now.getTime()}`)
  const educator = people.find(({ role }) => role === 'educator')
  if (!educator) return []
  const registered = people.filter(({ supervised, wardIds }) => !supervised && wardIds.length > 0)
  const nurses = registered.filter(({ role }) => role === 'nurse')
  const signed = (person: DemoPerson, skill: Skill, level: Level, daysAgo: number) =>
    signOffOf({ person, skill, level, daysAgo, educator, now, zone, random })
  const leads = registered.filter(({ role }) => role === 'tracheostomy specialist' || role === 'charge nurse')
  const therapists = registered.filter(({ role }) => role === 'respiratory therapist')
  return [
    ...nurses.flatMap((person, index) => {
      const ago = nursesAgo[index % nursesAgo.length] ?? null
      const level: Level = index % nursesAgo.length === 2 ? 'supervised' : 'independent'
      return ago === null ? [] : [signed(person, 'tube change, performing', level, ago)]
    }),
    ...therapists.flatMap(person => [
      signed(person, 'tube change, performing', 'independent', 90),
      signed(person, 'decannulation', 'independent', 90),
      signed(person, 'valve and cap', 'independent', YEAR - 20),
    ]),
    ...leads.flatMap(person => [
      signed(person, 'tube change, performing', 'assessor', 150),
      signed(person, 'decannulation', 'assessor', 150),
      signed(person, 'valve and cap', 'assessor', 150),
    ]),
  ]
}

interface Plan {
  readonly person: DemoPerson
  readonly skill: Skill
  readonly level: Level
  readonly daysAgo: number
  readonly educator: DemoPerson
  readonly now: Date
  readonly zone: Zone
  readonly random: Random
}

function signOffOf({ person, skill, level, daysAgo, educator, now, zone, random }: Plan): DemoSignOff {
  const assessedOn = addDays(localDay(now, zone), -daysAgo)
  const signedAt = new Date(startOfDay(assessedOn, zone).getTime() + 14 * 3_600_000)
  const days = { assessedOn, expiresOn: addDays(assessedOn, YEAR), signedAt }
  return { id: idAt(signedAt, random), userId: person.id, skill, level, ...days, assessedBy: educator }
}

/** The rows of their table. */
export function competenceRows(signOffs: readonly DemoSignOff[]) {
  return signOffs.map(({ id, userId, skill, level, assessedOn, expiresOn, assessedBy, signedAt }) => ({
    ...{ id, user_id: userId, skill, level, assessed_on: assessedOn, expires_on: expiresOn },
    ...{ assessed_by: assessedBy.id, assessed_role: assessedBy.role, signed_at: signedAt },
  }))
}

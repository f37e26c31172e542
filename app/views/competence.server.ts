import { type CurrentUser, can } from '#app/auth/permissions.ts'
import { policyInForce, valueUnder } from '#app/care/policy.ts'
import { competenceMonths, competenceNotice } from '#app/care/signing-settings.ts'
import { type Skill, skills, standingWords } from '#app/care/skills.ts'
import { env } from '#app/env.server.ts'
import { assesses, competenceGaps, type Gap, monthsLater, type SignOff, skillsAskedFor } from '#app/rules/competence.ts'
import { showDay } from '#app/time/display.ts'
import { type LocalDay, localDay } from '#app/time/zone.ts'
import { type Staff, signOffsOf, staffOf } from '#database/competences.server.ts'
import { policies } from '#database/policies.server.ts'
import { type Person, person } from '#database/users.server.ts'
import { allWards } from '#database/wards.server.ts'
import { type ShiftCover, shiftCover, writingOf } from './shift-cover.server.ts'

/** One line of the list of a ward. */
export interface GapLine {
  readonly key: string
  readonly userId: string
  readonly name: string
  readonly role: string
  readonly skill: string
  readonly stands: string
}

/** What is missing on a ward, and what runs out soon. */
export interface WardGaps {
  readonly id: string
  readonly name: string
  readonly people: number
  readonly gaps: readonly GapLine[]
  readonly expiring: readonly GapLine[]
  readonly noticeDays: number
  readonly byShift: ShiftCover
}

/** The gaps of every ward that this person keeps an eye on; four queries for all of them. */
export async function wardGaps(user: CurrentUser, now: Date): Promise<readonly WardGaps[]> {
  const wards = (await allWards()).filter(({ id, retired }) => !retired && can(user, 'see competence gaps', id))
  const known = await policies()
  const written = await writingOf(wards, known, now)
  const staff = await staffOf(wards.map(({ id }) => id))
  const signOffs = await signOffsOf([
    ...new Set([...staff.map(({ id }) => id), ...written.map(({ userId }) => userId)]),
  ])
  const today = localDay(now, env.hospitalTimeZone)
  return wards.map(ward => {
    const { id, name } = ward
    const people = staff.filter(one => one.wardId === id && can({ role: one.role, wardIds: [id] }, 'chart care', id))
    const noticeDays = valueUnder(policyInForce(known, id, now), competenceNotice)
    const { gaps, expiring } = competenceGaps(people, signOffs, { today, noticeDays, asked: skillsAskedFor() })
    const lines = (found: readonly Gap<Staff>[]) => found.map(gapLine)
    const byShift = shiftCover(ward, { written, signOffs, policy: policyInForce(known, id, now), now })
    return { id, name, people: people.length, gaps: lines(gaps), expiring: lines(expiring), noticeDays, byShift }
  })
}

function gapLine({ person: { id, name, role }, skill, standing, expiresOn }: Gap<Staff>): GapLine {
  const until = expiresOn === null ? '' : `, ${standing === 'out of date' ? 'since' : 'until'} ${showDay(expiresOn)}`
  return {
    key: `${id} ${skill}`,
    ...{ userId: id, name, role },
    skill: skills[skill],
    stands: `${standingWords[standing]}${until}`,
  }
}

/** Somebody's competence as another may see it. */
export interface OpenedCompetence {
  readonly person: Person
  readonly signOffs: readonly SignOff[]
  /** The skills that whoever looks may sign off for them. */
  readonly assessable: readonly Skill[]
  readonly today: LocalDay
}

/** One person's sign-offs, if this is theirs to see: one's own, those of people one leads, or may assess. Null otherwise. */
export async function openedCompetence(user: CurrentUser, userId: string, now: Date): Promise<OpenedCompetence | null> {
  const found = await person(userId)
  if (!found) return null
  const today = localDay(now, env.hospitalTimeZone)
  const wardIds = found.wards.map(({ id }) => id)
  const assessable = userId === user.id ? [] : await assessableBy(user, wardIds, today)
  const leads = wardIds.some(id => can(user, 'see competence gaps', id)) || can(user, 'sign off competence')
  if (userId !== user.id && !leads && assessable.length === 0) return null
  return { person: found, signOffs: await signOffsOf([userId]), assessable, today }
}

const allSkills = Object.keys(skills) as readonly Skill[]

async function assessableBy(user: CurrentUser, wardIds: readonly string[], today: LocalDay): Promise<readonly Skill[]> {
  if (can(user, 'sign off competence')) return allSkills
  if (user.isSupervised || !wardIds.some(id => user.wardIds.includes(id))) return []
  const own = await signOffsOf([user.id])
  return allSkills.filter(skill => assesses(own, skill, today))
}

/** The last day of a sign-off, by the policy of the person's ward, or by the product's default where they have none. */
export async function lastDay(person: Person, assessedOn: LocalDay, now: Date): Promise<LocalDay> {
  const [ward] = person.wards
  const policy = ward && policyInForce(await policies(), ward.id, now)
  return monthsLater(assessedOn, valueUnder(policy, competenceMonths))
}

import type { AnyCareKind } from '../care/kind.ts'
import { careKinds } from '../care/kinds.ts'
import type { CompetenceStanding, Level, Skill } from '../care/skills.ts'
import { addDays, type LocalDay } from '../time/zone.ts'

/** One sign-off of a skill, as it is stored. `expiresOn` is the last day on which it holds. */
export interface SignOff {
  readonly id: string
  readonly userId: string
  readonly skill: string
  readonly level: Level
  readonly assessedOn: LocalDay
  readonly expiresOn: LocalDay
  readonly assessedById: string
  readonly assessedByName: string
  readonly signedAt: Date
  readonly withdrawn: { readonly by: string; readonly at: Date; readonly reason: string } | null
}

/** The latest sign-off of a skill that was not withdrawn: a later one takes the place of those before, at whatever level. */
export function signOffIn(signOffs: readonly SignOff[], skill: Skill): SignOff | undefined {
  return signOffs
    .filter(one => one.skill === skill && one.withdrawn === null)
    .toSorted((a, b) => b.signedAt.getTime() - a.signedAt.getTime())[0]
}

/** How somebody stands in a skill on a day, by their own sign-offs. */
export function standingIn(signOffs: readonly SignOff[], skill: Skill, today: LocalDay): CompetenceStanding {
  const latest = signOffIn(signOffs, skill)
  if (!latest) return 'missing'
  if (latest.expiresOn < today) return 'out of date'
  return latest.level === 'supervised' ? 'supervised' : 'held'
}

/** Whether somebody may assess others in a skill on a day. */
export function assesses(signOffs: readonly SignOff[], skill: Skill, today: LocalDay): boolean {
  const latest = signOffIn(signOffs, skill)
  return latest !== undefined && latest.level === 'assessor' && latest.expiresOn >= today
}

/** The skills that some kind of care asks for, once each. */
export function skillsAskedFor(kinds: readonly AnyCareKind[] = careKinds): readonly Skill[] {
  return [...new Set(kinds.flatMap(kind => kind.needsCompetence ?? []))]
}

/** Somebody who lacks a skill that an act asks for, or soon will. */
export interface Gap<Person> {
  readonly person: Person
  readonly skill: Skill
  readonly standing: CompetenceStanding
  /** The last day of a sign-off that there is or was. */
  readonly expiresOn: LocalDay | null
}

/** What is missing among these people, and what they hold that runs out within so many days. */
export function competenceGaps<Person extends { readonly id: string }>(
  people: readonly Person[],
  signOffs: readonly SignOff[],
  {
    today,
    noticeDays,
    asked,
  }: { readonly today: LocalDay; readonly noticeDays: number; readonly asked: readonly Skill[] },
): { readonly gaps: readonly Gap<Person>[]; readonly expiring: readonly Gap<Person>[] } {
  const all = people.flatMap(person => {
    const own = signOffs.filter(({ userId }) => userId === person.id)
    return asked.map(skill => ({
      person,
      skill,
      standing: standingIn(own, skill, today),
      expiresOn: signOffIn(own, skill)?.expiresOn ?? null,
    }))
  })
  const until = addDays(today, noticeDays)
  return {
    gaps: all.filter(({ standing }) => standing !== 'held'),
    expiring: all
      .filter(({ standing, expiresOn }) => standing === 'held' && expiresOn !== null && expiresOn <= until)
      .toSorted((a, b) => (a.expiresOn ?? '').localeCompare(b.expiresOn ?? '')),
  }
}

/** What somebody held that is out of date, or soon will be: what they are reminded of. */
export function competenceReminders<Person extends { readonly id: string }>(
  person: Person,
  signOffs: readonly SignOff[],
  about: Parameters<typeof competenceGaps<Person>>[2],
): readonly Gap<Person>[] {
  const { gaps, expiring } = competenceGaps([person], signOffs, about)
  return [...gaps.filter(({ standing }) => standing === 'out of date'), ...expiring]
}

/** The same day so many months later, or the last day of a shorter month: `2026-08-31` and 6 give `2027-02-28`. */
export function monthsLater(day: LocalDay, months: number): LocalDay {
  const [year = 0, month = 0, date = 0] = day.split('-').map(Number)
  const count = year * 12 + month - 1 + months
  const last = new Date(Date.UTC(Math.floor(count / 12), (count % 12) + 1, 0)).getUTCDate()
  const pad = (number: number) => String(number).padStart(2, '0')
  return `${Math.floor(count / 12)}-${pad((count % 12) + 1)}-${pad(Math.min(date, last))}`
}

import type { AnyCareKind } from '../care/kind.ts'
import { careKinds } from '../care/kinds.ts'
import type { Skill } from '../care/skills.ts'
import { nextShift, type Shift, type ShiftTimes, shiftAt } from '../time/shift.ts'
import { type LocalDay, localDay, type Zone } from '../time/zone.ts'
import { type SignOff, skillsAskedFor, standingIn } from './competence.ts'

/** Something that somebody wrote down on a ward, not under supervision. */
export interface Written {
  readonly userId: string
  readonly at: Date
  readonly kind: string
  /** An act of its own, neither a correction nor a retraction. */
  readonly isAct: boolean
}

/** How often a shift of the day was without anybody in date for a skill. */
export interface ShiftGap {
  /** `Shift from 23:00` */
  readonly shift: string
  readonly skill: Skill
  /** How many of these shifts somebody charted in. */
  readonly shifts: number
  /** The days on which those began in which nobody who charted was in date. */
  readonly without: readonly LocalDay[]
  /** Acts that ask for the skill, charted in those. */
  readonly acts: number
}

interface Asked {
  readonly written: readonly Written[]
  readonly signOffs: readonly SignOff[]
  readonly ward: { readonly shiftTimes: ShiftTimes; readonly zone: Zone }
  /** What was written from then on; the shift of `now` is not over and does not count. */
  readonly from: Date
  readonly now: Date
  readonly kinds?: readonly AnyCareKind[]
}

/**
 * The skills that were missing on a ward, by shift of the day. Nobody keeps a roster here: whoever charted in a shift was there, and a
 * shift in which nobody charted says nothing. Held is what was signed off by the end of the shift, and in date on the day it began.
 */
export function shiftGaps({ written, signOffs, ward, from, now, kinds = careKinds }: Asked): readonly ShiftGap[] {
  const shifts = wholeShifts(ward, from, now)
    .map(shift => ({ shift, acts: written.filter(({ at }) => at >= shift.startsAt && at < shift.endsAt) }))
    .filter(({ acts }) => acts.length > 0)
  const labels = [...new Set(shifts.map(({ shift }) => shift.label))].toSorted()
  const skillOf = new Map(kinds.map(({ slug, needsCompetence }) => [slug, needsCompetence]))
  return labels.flatMap(label => {
    const alike = shifts.filter(({ shift }) => shift.label === label)
    return skillsAskedFor(kinds).flatMap(skill => {
      const without = alike.filter(({ shift, acts }) => !isCovered(skill, shift, acts, signOffs, ward.zone))
      if (without.length === 0) return []
      const asking = without.flatMap(({ acts }) => acts.filter(act => act.isAct && skillOf.get(act.kind) === skill))
      const days = without.map(({ shift }) => localDay(shift.startsAt, ward.zone))
      return [{ shift: label, skill, shifts: alike.length, without: days, acts: asking.length }]
    })
  })
}

/** The shifts that began at or after a moment and are over. */
function wholeShifts({ shiftTimes, zone }: Asked['ward'], from: Date, now: Date): readonly Shift[] {
  const shifts: Shift[] = []
  for (let shift = shiftAt(from, shiftTimes, zone); shift.endsAt <= now; shift = nextShift(shift, shiftTimes, zone)) {
    if (shift.startsAt >= from) shifts.push(shift)
  }
  return shifts
}

function isCovered(
  skill: Skill,
  { startsAt, endsAt }: Shift,
  acts: readonly Written[],
  signOffs: readonly SignOff[],
  zone: Zone,
): boolean {
  const day = localDay(startsAt, zone)
  const people = new Set(acts.map(({ userId }) => userId))
  return [...people].some(person => {
    const own = signOffs.filter(({ userId, signedAt }) => userId === person && signedAt < endsAt)
    return standingIn(own, skill, day) === 'held'
  })
}

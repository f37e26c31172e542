import { type Policy, policyInForce, valueUnder } from '#app/care/policy.ts'
import { competenceShiftDays } from '#app/care/signing-settings.ts'
import { skills } from '#app/care/skills.ts'
import { env } from '#app/env.server.ts'
import type { SignOff } from '#app/rules/competence.ts'
import { type ShiftGap, shiftGaps } from '#app/rules/shift-cover.ts'
import { showDay } from '#app/time/display.ts'
import { days, earlier } from '#app/time/duration.ts'
import { type WardWriting, writtenSince } from '#database/shift-writing.server.ts'
import type { Ward } from '#database/wards.server.ts'

/** How often each shift of a ward was without somebody in date, in words. */
export interface ShiftCover {
  readonly days: number
  readonly lines: readonly ShiftLine[]
}

export interface ShiftLine {
  readonly key: string
  readonly shift: string
  readonly skill: string
  /** `3 of 7 shifts: 28-Nov-2026, 29-Nov-2026, 30-Nov-2026` */
  readonly without: string
  /** `2 were charted in those`, of acts that ask for it. */
  readonly acts: string
}

/** What was written on these wards, as far back as any of them counts; one query. */
export async function writingOf(
  wards: readonly Ward[],
  known: readonly Policy[],
  now: Date,
): Promise<readonly WardWriting[]> {
  const most = Math.max(...wards.map(({ id }) => valueUnder(policyInForce(known, id, now), competenceShiftDays)), 0)
  return writtenSince(
    wards.map(({ id }) => id),
    earlier(now, days(most)),
  )
}

interface Known {
  readonly written: readonly WardWriting[]
  readonly signOffs: readonly SignOff[]
  readonly policy: Policy | undefined
  readonly now: Date
}

/** The gaps of one ward by shift. */
export function shiftCover(ward: Ward, { written, signOffs, policy, now }: Known): ShiftCover {
  const back = valueUnder(policy, competenceShiftDays)
  const gaps = shiftGaps({
    written: written.filter(({ wardId }) => wardId === ward.id),
    signOffs,
    ward: { shiftTimes: ward.shiftTimes, zone: env.hospitalTimeZone },
    from: earlier(now, days(back)),
    now,
  })
  return { days: back, lines: gaps.map(shiftLine) }
}

function shiftLine({ shift, skill, shifts, without, acts }: ShiftGap): ShiftLine {
  return {
    key: `${shift} ${skill}`,
    shift,
    skill: skills[skill],
    without: `${without.length} of ${shifts}: ${without.map(showDay).join(', ')}`,
    acts: acts === 0 ? 'none' : String(acts),
  }
}

import type { StoredEntry } from '#app/care/kind.ts'
import type { Policy } from '#app/care/policy.ts'
import { patientRecord } from '#app/care/record.ts'
import { warningAnswers } from '#app/care/warning-answer/schema.ts'
import { careContext } from '#app/rules/context.ts'
import { type WarningLife, warningLives } from '#app/rules/warning-lives.ts'
import { earlier, later, minutes } from '#app/time/duration.ts'
import type { Bedside } from './bedside.ts'
import { type Draft, draft } from './draft.ts'

const SEEN_SHARE = 0.85

/** What the people of the demo hospital answered to warnings that stand now: most are seen, some are left for the board to show. */
export function answersTo(entries: readonly StoredEntry[], bedside: Bedside): readonly Draft[] {
  const { story, now, zone, random, place, admittedAt } = bedside
  if (story.discharged) return []
  const { shiftTimes, pressureUnit } = place.ward.row
  const record = patientRecord(entries, { admittedAt, patient: story.patient })
  const context = careContext({ record, policy: policyOf(bedside), ward: { zone, shiftTimes, pressureUnit }, now })
  return warningLives(context)
    .filter(({ warning }) => warning.level !== 'blue' && random.chance(SEEN_SHARE))
    .map(life => draft(warningAnswers, seenAt(life, bedside), { warning: life.warning.name, answer: 'seen' }))
}

function seenAt({ raised }: WarningLife, { now, random }: Bedside): Date {
  const from = raised?.at ?? earlier(now, minutes(random.between(40, 300)))
  const at = later(from, minutes(random.between(2, 12)))
  return new Date(Math.min(Math.floor(at.getTime()), now.getTime()))
}

/** Enough of the ward's policy to see what stands. */
function policyOf({ now, band }: Bedside): Policy {
  return {
    id: 'demo',
    name: 'Tracheostomy care',
    version: 1,
    wardId: null,
    reviewedBy: '',
    reviewedOn: '2026-01-02',
    startsAt: earlier(now, minutes(1)),
    values: { 'cuff-pressure-upper-limit': band.upper, 'cuff-pressure-lower-limit': band.lower },
  }
}

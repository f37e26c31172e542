import type { CurrentUser } from '#app/auth/permissions.ts'
import { policyInForce, valueUnder } from '#app/care/policy.ts'
import { competenceNotice } from '#app/care/signing-settings.ts'
import { skills } from '#app/care/skills.ts'
import { env } from '#app/env.server.ts'
import { competenceReminders, type Gap, type SignOff, skillsAskedFor } from '#app/rules/competence.ts'
import { showDay } from '#app/time/display.ts'
import { localDay } from '#app/time/zone.ts'
import { signOffsOf } from '#database/competences.server.ts'
import { policies } from '#database/policies.server.ts'

/** `Tube change, performing: your sign-off runs out on 12-Dec-2026.`, one for each skill that somebody held and is to have assessed again. */
export async function ownReminders(user: CurrentUser, wardId: string, now: Date): Promise<readonly string[]> {
  return remindersOf(user, await signOffsOf([user.id]), wardId, now)
}

/** The same of sign-offs that are known already. */
export async function remindersOf(
  person: { readonly id: string },
  signOffs: readonly SignOff[],
  wardId: string | undefined,
  now: Date,
): Promise<readonly string[]> {
  const policy = wardId === undefined ? undefined : policyInForce(await policies(), wardId, now)
  const about = {
    today: localDay(now, env.hospitalTimeZone),
    noticeDays: valueUnder(policy, competenceNotice),
    asked: skillsAskedFor(),
  }
  return competenceReminders(person, signOffs, about).map(reminderWords)
}

function reminderWords({ skill, standing, expiresOn }: Gap<{ readonly id: string }>): string {
  const when = expiresOn === null ? '' : ` on ${showDay(expiresOn)}`
  return `${skills[skill]}: the sign-off ${standing === 'out of date' ? 'ran' : 'runs'} out${when}.`
}

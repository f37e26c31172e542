import { v7 as uuidv7 } from 'uuid'
import type { CurrentUser } from '#app/auth/permissions.ts'
import type { AnyCareKind } from '#app/care/kind.ts'
import { aTube } from '#app/care/make.ts'
import { tubeChange } from '#app/care/tube-change/kind.ts'
import type { ChartAnswer } from '#app/charting/chart-answer.ts'
import { typedFrom } from '#app/charting/chart-form.ts'
import { action as chartAction, loader as chartLoader } from '#app/routes/chart.tsx'
import { days, earlier } from '#app/time/duration.ts'
import { addEntry } from '#database/entries.server.ts'
import { addPolicy } from '#database/policies.server.ts'
import { answerOf, contextOf, site } from './people.ts'
import { admitted, aWardOf } from './stays.ts'

/** So many days before now: the database refuses what has not happened yet, so charting is tested with its real clock. */
export const daysAgo = (count: number): Date => earlier(new Date(), days(count))

/** A ward with a policy, a nurse, and a patient who came 40 days ago, or when it is said, with a cuffed tube of that day. */
export async function aCharting(admittedAt = daysAgo(40)) {
  const ward = await aWardOf(2)
  await addPolicy(
    {
      id: uuidv7(),
      name: 'Tracheostomy care',
      wardId: null,
      reviewedBy: 'M. Osei',
      reviewedOn: '2024-01-02',
      startsAt: new Date('2024-01-05T00:00:00.000Z'),
      values: {},
      reason: 'First set',
    },
    null,
  )
  const { stayId, patientId } = await admitted(ward.id, ward.bedIds[0] ?? '', ward.nurse.id, { admittedAt })
  const { nurse } = ward
  await addEntry({ id: uuidv7(), kind: tubeChange, stayId, performedAt: admittedAt, recordedBy: nurse, data: aTube() })
  return { ward, nurse, stayId, patientId }
}

/** Names with their values, as many as there are: what a browser would send. */
export type Sent = readonly (readonly [string, string])[]

/** A whole form of a kind, answered with its first example or with `care`, done now and signed by `user`. */
export function wholeForm(
  kind: AnyCareKind,
  user: CurrentUser,
  care: Readonly<Record<string, unknown>> = kind.examples[0],
): Sent {
  const answers = Object.entries(typedFrom(care)).flatMap(([name, values]) =>
    values.map(value => [name, value] as const),
  )
  return [['id', uuidv7()], ['openedBy', user.id], ['at', new Date().toISOString()], ['when', 'now'], ...answers]
}

/** The form with some of its fields given other values, or none with undefined. */
export function changed(form: Sent, changes: Readonly<Record<string, string | undefined>>): Sent {
  const kept = form.filter(([name]) => !Object.hasOwn(changes, name))
  return [
    ...kept,
    ...Object.entries(changes).flatMap(([name, value]) => (value === undefined ? [] : [[name, value] as const])),
  ]
}

/** A request of this site that sends a form. */
export function sentRequest(path: string, form: Sent | FormData): Request {
  const body = form instanceof FormData ? form : new URLSearchParams(form.map(([name, value]) => [name, value]))
  return new Request(`${site}${path}`, { method: 'POST', body, headers: { Origin: site } })
}

/** What comes of sending a chart form of this kind. */
export function chart(
  user: CurrentUser,
  patientId: string,
  slug: string,
  form: Sent | FormData | Request,
  signedInAt?: Date,
) {
  const path = `/patients/${patientId}/chart/${slug}`
  const request = form instanceof Request ? form : sentRequest(path, form)
  const args = {
    params: { patientId, kind: slug },
    request,
    url: new URL(request.url),
    context: contextOf(user, undefined, signedInAt),
  }
  return answerOf(() => chartAction({ ...args, pattern: '/patients/:patientId/chart/:kind' }))
}

/** What the loader of a chart form hands to its page. */
export async function openedForm(user: CurrentUser, patientId: string, slug: string, search = '', signedInAt?: Date) {
  const request = new Request(`${site}/patients/${patientId}/chart/${slug}${search}`)
  const args = {
    params: { patientId, kind: slug },
    request,
    url: new URL(request.url),
    context: contextOf(user, undefined, signedInAt),
  }
  return answerOf(() => chartLoader({ ...args, pattern: '/patients/:patientId/chart/:kind' }))
}

/** What a form was refused with. Throws when it was not refused. */
export function refusalOf({ says }: { readonly says?: unknown }): ChartAnswer & { readonly is: 'refused' } {
  const answer = says as ChartAnswer
  if (answer.is !== 'refused') throw new Error(`The form was ${answer.is}`)
  return answer
}

import { v7 as uuidv7 } from 'uuid'
import { cuffUpper } from '#app/care/cuff-pressure/settings.ts'
import { inspectionInterval } from '#app/care/inner-cannula/settings.ts'
import { action as admit } from '#app/routes/admit.tsx'
import { action as draftPolicy } from '#app/routes/policy-draft.tsx'
import { action as publishPolicy } from '#app/routes/policy-review.tsx'
import { addPolicy } from '#database/policies.server.ts'
import { answerOf, aPerson, contextOf, formRequest } from '#test/people.ts'
import { aWardOf } from '#test/stays.ts'
import { at } from './clock.ts'
import type { Scene, Step } from './play.ts'

/** A ward of two shifts under the product's own numbers, with the people of the story. */
export async function aWardOfTwoShifts() {
  const ward = await aWardOf(1, 'Ward 7', ['07:00', '19:00'])
  const start = { reviewedBy: 'M. Osei', reviewedOn: '2026-09-01', startsAt: at(-30, '07:00') }
  await addPolicy(
    { id: uuidv7(), name: 'Tracheostomy care', wardId: ward.id, ...start, values: {}, reason: 'First set' },
    null,
  )
  const someone = (name: string, role: 'nurse' | 'charge nurse' | 'tracheostomy specialist') =>
    aPerson({ name, role, wardIds: [ward.id] })
  return {
    ...ward,
    people: {
      'day nurse': await someone('Dana Day', 'nurse'),
      'night nurse': await someone('Noel Night', 'nurse'),
      'charge nurse': await someone('Cleo Charge', 'charge nurse'),
      specialist: await someone('Sana Specialist', 'tracheostomy specialist'),
    },
  }
}

/** Admits the patient by the form of the ward. */
export async function admitted({ id: wardId, bedIds, people }: Awaited<ReturnType<typeof aWardOfTwoShifts>>) {
  const user = people['day nurse']
  const stayId = uuidv7()
  const request = formRequest(`/wards/${wardId}/admit`, {
    ...{ id: stayId, openedBy: user.id, at: new Date().toISOString(), when: 'now', bedId: bedIds[0] ?? '' },
    ...{ 'person.recordNumber': 'AB-12', 'person.bornOn': '1961-03-14', 'person.familyName': 'Okafor' },
    ...{ 'person.givenName': 'Ada', 'person.sex': 'female', 'person.upperAirway': 'open', 'person.ventilated': 'no' },
    ...{ 'person.spo2Low': '94', 'person.spo2High': '98' },
  })
  const args = { request, url: new URL(request.url), context: contextOf(user), params: { wardId } }
  const answer = await answerOf(async () => admit({ ...args, pattern: '/wards/:wardId/admit' }))
  const patientId = answer.location?.split('/').at(-1)
  if (answer.status !== 302 || patientId === undefined) throw new Error(`Not admitted: ${JSON.stringify(answer)}`)
  return { patientId, stayId, wardId, people, called: new Map<string, string>() } satisfies Scene
}

/** On day 14 the second version of the policy: cannulas looked at every 6 hours, cuffs up to 25 cmH2O. */
export const secondVersion: Step = {
  at: at(14, '11:50'),
  async run({ wardId, people }) {
    const user = people.specialist
    const numbers = { [`value.${inspectionInterval.name}`]: '6', [`value.${cuffUpper.name}`]: '25' }
    const drafted = sentBy(user, `/policy/draft?ward=${wardId}`, { rev: '0', intent: 'save', ...numbers })
    const saved = await answerOf(async () => draftPolicy({ ...drafted, params: {}, pattern: '/policy/draft' }))
    const said = { id: uuidv7(), rev: '1', reviewer: people['charge nurse'].id, reviewedOn: '2026-10-19' }
    const why = { name: 'Tracheostomy care', reason: 'Two blocked inner cannulas', start: 'now' }
    const sent = sentBy(user, `/policy/review?ward=${wardId}`, { ...said, ...why })
    const published = await answerOf(async () => publishPolicy({ ...sent, params: {}, pattern: '/policy/review' }))
    if (saved.status !== 302 || published.status !== 302) throw new Error(JSON.stringify([saved, published]))
  },
}

function sentBy(user: Scene['people']['specialist'], path: string, fields: Record<string, string>) {
  const request = formRequest(path, fields)
  return { request, url: new URL(request.url), context: contextOf(user) }
}

import type { CurrentUser } from '#app/auth/permissions.ts'
import { changed, chart, refusalOf, type Sent, wholeForm } from '#test/charting.ts'
import { aRetractionForm, entryPages } from '#test/entries.ts'
import type { Act } from './acts.ts'
import { at } from './clock.ts'
import { rounds } from './routine.ts'
import { leftOut, type Row, retractions, type Sending, story, type Who } from './story.ts'

/** Where and by whom the story is played. */
export interface Scene {
  readonly patientId: string
  readonly stayId: string
  readonly wardId: string
  readonly people: Readonly<Record<Who, CurrentUser>>
  /** Ids of entries that the story speaks of again, by name. */
  readonly called: Map<string, string>
}

/** Something that happens at a moment. */
export interface Step {
  readonly at: Date
  run(scene: Scene): Promise<void>
}

/** Everything that is charted in the stay, as it is written down: the rounds of each day with the story between them. */
export function charting(): readonly Step[] {
  const routine = rounds.flatMap(([times, act, from, to]) =>
    daysFrom(from, to).flatMap(day => times.split(' ').map((time): Row => [day, time, act])),
  )
  const done = routine.filter(([day, time]) => !leftOut.some(([on, when]) => on === day && when === time))
  return [
    ...[...done, ...story].map(([day, time, act, sending = {}]) => ({
      at: at(day, time),
      run: (scene: Scene) => send(scene, [day, time, act, sending]),
    })),
    ...retractions.map(([day, time, name]) => ({ at: at(day, time), run: (scene: Scene) => retract(scene, name) })),
  ]
}

function daysFrom(from: number, to: number): readonly number[] {
  return Array.from({ length: to - from + 1 }, (_, index) => from + index)
}

/** Sends the form of an act, and holds what comes of it against the story. */
async function send(scene: Scene, [day, time, act, sending]: Row & { 3: Sending }): Promise<void> {
  const user = scene.people[sending.who ?? nurseAt(time)]
  const form = formOf(act, user, day, sending)
  if (sending.called !== undefined) scene.called.set(sending.called, form.find(([name]) => name === 'id')?.[1] ?? '')
  const answer = sending.corrects
    ? await entryPages.correct(user, entryOf(scene, sending.corrects), form)
    : await chart(user, scene.patientId, act.kind.slug, form)
  const what = `day ${day} ${time} ${act.kind.slug}`
  if (sending.refusedAt) return mustRefuse(what, answer, sending.refusedAt)
  const isUrgent = answer.location?.includes('/act-now/') ?? false
  if (answer.status !== 302 || isUrgent !== (sending.isUrgent ?? false)) {
    throw new Error(`${what} was answered ${JSON.stringify(answer)}`)
  }
}

function mustRefuse(
  what: string,
  answer: Awaited<ReturnType<typeof chart>>,
  [field, words]: NonNullable<Sending['refusedAt']>,
): void {
  const said = answer.status === 302 ? undefined : refusalOf(answer).errors[field]?.join(' ')
  if (said === undefined || !words.test(said)) throw new Error(`${what} was not refused: ${JSON.stringify(answer)}`)
}

function nurseAt(time: string): Who {
  return time >= '07:00' && time < '19:00' ? 'day nurse' : 'night nurse'
}

function formOf({ kind, answers }: Act, user: CurrentUser, day: number, { doneAt, corrects }: Sending): Sent {
  const form = wholeForm(kind, user, answers)
  const done = at(day, doneAt ?? '00:00')
    .toISOString()
    .slice(0, 10)
  return changed(form, {
    ...(doneAt === undefined ? {} : { when: 'other', day: done, time: doneAt }),
    ...(corrects === undefined ? {} : { reason: 'Looked at the wrong row of the paper' }),
  })
}

async function retract(scene: Scene, name: string): Promise<void> {
  const user = scene.people['day nurse']
  const answer = await entryPages.retract(user, entryOf(scene, name), aRetractionForm(user))
  if (answer.status !== 302) throw new Error(`The ${name} was not retracted: ${JSON.stringify(answer)}`)
}

/** The id of an entry by its name in the story. */
export function entryOf({ called }: Scene, name: string): string {
  const id = called.get(name)
  if (id === undefined) throw new Error(`The story has no ${name} yet`)
  return id
}

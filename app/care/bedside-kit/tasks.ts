import { minutes } from '../../time/duration.ts'
import { type Clock, promptClock, shiftClock, sooner } from '../clock.ts'
import { cuffChecks } from '../cuff-pressure/schema.ts'
import type { CareContext, TaskRule } from '../kind.ts'
import { isArrival, transfers } from '../transfer-checklist/schema.ts'
import { tubeCareFrom } from '../tube-care.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { withoutTube } from '../tube-change/tasks.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { gapsSince, type KitEntry, lastComplete } from './gaps.ts'
import { kitAfterEvent, kitMissingWithin } from './settings.ts'

const check: TaskRule = {
  name: 'bedside-kit-check',
  airway: true,
  settings: [kitAfterEvent, kitMissingWithin],
  says: ({ values }) =>
    `Once in each shift; within ${values.of(kitAfterEvent)} minutes of a tube change, admission or transfer; within ${values.of(kitMissingWithin)} minutes when something was missing. Only a complete kit counts.`,
  clock(context) {
    const { record, ward } = context
    if (!tubeInPlace(record)) return withoutTube(context)
    const done = lastComplete(record)
    const regular = shiftClock({ last: done, start: tubeCareFrom(context), ward })
    return [afterEvent(done, context), afterGap(done, context)].reduce<Clock>(
      (clock, prompt) => (prompt ? sooner(clock, prompt) : clock),
      regular,
    )
  },
}

/** The first event with no complete kit since: what had to lie there has changed, or the patient came away from it. */
function afterEvent(done: KitEntry | undefined, context: CareContext): Clock | undefined {
  const first = events(context)
    .filter(({ at }) => !done || done.performedAt < at)
    .toSorted((a, b) => a.at.getTime() - b.at.getTime())[0]
  if (!first) return undefined
  const within = minutes(context.values.of(kitAfterEvent))
  return promptClock({ event: first.at, within, last: done, because: first.words })
}

/** Moves between beds are not part of the record: an arrival charted on the transfer checklist, or a cuff checked for one, tells of them. */
function events(context: CareContext): readonly { readonly at: Date; readonly words: string }[] {
  const { record } = context
  const from = tubeCareFrom(context)
  const came = from.getTime() === record.admittedAt.getTime()
  const changes = record
    .since(tubeChanges, from)
    .filter(({ data }) => data.reason !== 'on arrival' && data.difficulty !== 'failed')
  const moves = [
    ...record.since(cuffChecks, from).filter(({ data }) => data.reason === 'transfer'),
    ...record.since(transfers, from).filter(isArrival),
  ]
  return [
    { at: from, words: came ? 'the patient came to the ward' : 'the tube was put in' },
    ...changes.filter(({ performedAt }) => performedAt > from).map(tube => eventOf(tube, 'the tube was changed')),
    ...moves.map(move => eventOf(move, 'the patient was moved')),
  ]
}

function eventOf({ performedAt }: { readonly performedAt: Date }, words: string) {
  return { at: performedAt, words }
}

function afterGap(done: KitEntry | undefined, { record, values }: CareContext): Clock | undefined {
  const first = gapsSince(record, done).at(-1)
  if (!first) return undefined
  const within = minutes(values.of(kitMissingWithin))
  return promptClock({
    event: first.performedAt,
    within,
    last: done,
    because: 'something was missing at the last check',
  })
}

export const kitTasks: readonly TaskRule[] = [check]

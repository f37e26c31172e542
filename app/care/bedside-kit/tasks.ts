import { minutes } from '../../time/duration.ts'
import { type Clock, promptClock, shiftClock, sooner } from '../clock.ts'
import type { CareContext, TaskRule } from '../kind.ts'
import { tubeCareFrom } from '../tube-care.ts'
import { withoutTube } from '../tube-change/tasks.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { kitEvents } from './events.ts'
import { gapsSince, type KitEntry, lastComplete } from './gaps.ts'
import { kitAfterEvent, kitMissingWithin } from './settings.ts'

const check: TaskRule = {
  name: 'bedside-kit-check',
  airway: true,
  settings: [kitAfterEvent, kitMissingWithin],
  says: ({ values }) =>
    `Once in each shift; within ${values.of(kitAfterEvent)} minutes of admission, a tube change, a move or an emergency; within ${values.of(kitMissingWithin)} minutes when something was missing. Only a complete kit counts.`,
  clock(context) {
    const { record, ward } = context
    if (!tubeInPlace(record)) return withoutTube(context)
    const done = lastComplete(record)
    const regular = shiftClock({ values: context.values, last: done, start: tubeCareFrom(context), ward })
    return [afterEvent(done, context), afterGap(done, context)].reduce<Clock>(
      (clock, prompt) => (prompt ? sooner(clock, prompt) : clock),
      regular,
    )
  },
}

/** The first event with no complete kit since. */
function afterEvent(done: KitEntry | undefined, context: CareContext): Clock | undefined {
  const first = kitEvents(context)
    .filter(({ at }) => !done || done.performedAt < at)
    .toSorted((a, b) => a.at.getTime() - b.at.getTime())[0]
  if (!first) return undefined
  const within = minutes(context.values.of(kitAfterEvent))
  return promptClock({ values: context.values, event: first.at, within, last: done, because: first.words })
}

function afterGap(done: KitEntry | undefined, { record, values }: CareContext): Clock | undefined {
  const first = gapsSince(record, done).at(-1)
  if (!first) return undefined
  const within = minutes(values.of(kitMissingWithin))
  return promptClock({
    values,
    event: first.performedAt,
    within,
    last: done,
    because: 'something was missing at the last check',
  })
}

export const kitTasks: readonly TaskRule[] = [check]

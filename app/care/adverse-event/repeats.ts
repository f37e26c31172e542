import { days, earlier } from '../../time/duration.ts'
import type { CareContext } from '../kind.ts'
import { cameAgain } from '../standing.ts'
import { repeatTubeOutWindow } from '../tube-change/settings.ts'
import type { Warning } from '../warning.ts'
import { type AdverseEventData, adverseEvents } from './schema.ts'

/** A tube that came out unplanned again within days, counting the event that is being charted. */
export function outAgain(data: AdverseEventData, context: CareContext): readonly Warning[] {
  return data.event === 'unplanned removal' ? again(1 + outSoFar(context), context) : []
}

/** The same, from what is charted. */
export function standingOutAgain(context: CareContext): readonly Warning[] {
  const out = context.record.of(adverseEvents).filter(({ data }) => data.event === 'unplanned removal')
  return again(cameAgain(out, days(context.values.of(repeatTubeOutWindow)), context).length, context)
}

function outSoFar({ record, values, now }: CareContext): number {
  return record
    .since(adverseEvents, earlier(now, days(values.of(repeatTubeOutWindow))))
    .filter(({ data, performedAt }) => data.event === 'unplanned removal' && performedAt <= now).length
}

/** By the name of the same rule of tube changes, so that one accident charted on both forms warns once. */
function again(times: number, { values }: CareContext): readonly Warning[] {
  if (times < 2) return []
  return [
    {
      name: 'tube-out-again',
      level: 'amber',
      action: 'Ask the tracheostomy specialist to review tube, length and ties today.',
      cause: `The tube came out unplanned ${times} times within ${values.of(repeatTubeOutWindow)} days.`,
      source: repeatTubeOutWindow.source.says,
    },
  ]
}

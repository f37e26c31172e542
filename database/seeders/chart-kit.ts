import { type KitData, kitChecks } from '#app/care/bedside-kit/schema.ts'
import { later, minutes } from '#app/time/duration.ts'
import { type Bedside, tubeAt } from './bedside.ts'
import { type Draft, draft } from './draft.ts'
import { leftOut, momentIn, shiftsOf } from './shifts.ts'
import type { PrintedTube } from './tubes.ts'

/** Checks of the bedside kit: one in each shift, and one after each event that asks for it. */
export function kitCare(bedside: Bedside): readonly Draft[] {
  const { story, until } = bedside
  const looks = shiftsOf(bedside)
    .slice(leftOut[story.stands.kit ?? 'done'])
    .flatMap(shift => momentIn(shift, bedside))
  const events = eventsOf(bedside).filter(at => at < until)
  return [...looks, ...events].flatMap(at => {
    const tube = tubeAt(bedside, at)?.tube
    return tube ? [draft(kitChecks, at, wholeKit(bedside, tube))] : []
  })
}

const SOON = minutes(12)

/** Soon after the patient came with a tube, after each tube that went in here, and after a move. */
function eventsOf({ tubes, admittedAt, earlierPlace }: Bedside): readonly Date[] {
  const [first] = tubes
  const arrival = first && !first.putInHere ? [later(admittedAt, minutes(24))] : []
  const changes = tubes.filter(({ putInHere }) => putInHere).map(({ from }) => later(from, SOON))
  return [...arrival, ...changes, ...(earlierPlace ? [later(earlierPlace.until, SOON)] : [])]
}

/** Everything there, held against the tube that is in. */
export function wholeKit({ random }: Bedside, tube: PrintedTube): KitData {
  const spares = [
    `Tube ${tube.line} ${tube.size} ${tube.sizeSystem} and one size smaller`,
    ...(tube.cuff === 'none' ? ['cuffed tube of the same size'] : []),
    ...(tube.construction === 'dual' ? [`plain inner cannula ${tube.line} ${tube.size}`] : []),
  ].join('; ')
  return { spares, complete: 'yes', suctionTested: random.pick([120, 120, 130, 140]), suctionUnit: 'mmHg' }
}

import { type InnerCannulaData, innerCannulaActs } from '#app/care/inner-cannula/schema.ts'
import {
  disposableInterval,
  earlyInterval,
  earlyPeriod,
  inspectionInterval,
  reusableInterval,
} from '#app/care/inner-cannula/settings.ts'
import { hours, since } from '#app/time/duration.ts'
import { type Bedside, pacedTimes, tubeAt } from './bedside.ts'
import { type Draft, draft } from './draft.ts'
import { packOf } from './tubes.ts'

/** Looks at the inner cannula and its renewals over the stay. A renewal is a look as well. */
export function innerCannulaCare(bedside: Bedside): readonly Draft[] {
  const { inner, innerRenewal } = bedside.story.stands
  if (inner === undefined) return []
  const looks = looksOf(bedside, inner)
  const last = looks[0]
  const every = renewalEvery(bedside)
  const sinceLast = last ? since(last, bedside.until) / hours(1) : every
  const renewals = pacedTimes(bedside, { every, pastDue: innerRenewal ?? sinceLast - every })
  const apart = looks.filter(at => !renewals.some(renewal => Math.abs(since(at, renewal)) < hours(2.5)))
  const looked = last && innerRenewal !== undefined && !apart.includes(last) ? [last, ...apart] : apart
  return [
    ...looked.flatMap(at => actAt(bedside, at, false, 0)),
    ...renewals.flatMap((at, index) => actAt(bedside, at, true, index)),
  ].filter(({ at }) => tubeAt(bedside, at)?.tube.construction === 'dual')
}

/** Twice as often in the first days of a tube that went in here; before it, the tube it replaced was an older one. */
function looksOf(bedside: Bedside, pastDue: number): readonly Date[] {
  const tube = tubeAt(bedside, bedside.until)
  if (!tube?.putInHere || since(tube.from, bedside.until) >= hours(earlyPeriod.default)) {
    return pacedTimes(bedside, { every: inspectionInterval.default, pastDue })
  }
  const often = pacedTimes(bedside, { every: earlyInterval.default, pastDue })
  return often.filter((at, index) => at > tube.from || index % 2 === 0)
}

function renewalEvery(bedside: Bedside): number {
  const isReusable = tubeAt(bedside, bedside.until)?.tube.innerCannula === 'reusable'
  return isReusable ? reusableInterval.default : disposableInterval.default
}

function actAt(bedside: Bedside, at: Date, renews: boolean, index: number): readonly Draft[] {
  const tube = tubeAt(bedside, at)?.tube
  if (tube?.construction !== 'dual') return []
  const { random } = bedside
  const act = !renews
    ? 'inspected'
    : tube.innerCannula === 'reusable'
      ? random.pick(['swapped', 'swapped', 'cleaned'])
      : 'replaced'
  const data: InnerCannulaData = {
    act,
    condition: renews && index % 2 === 1 ? coated(bedside) : random.pick(['clear', 'light']),
    line: tube.line,
    size: tube.size,
    ...(act === 'replaced' ? packOf(tube, at) : {}),
    locked: 'yes',
    spare: 'yes',
    tolerance: random.pick(['well', 'well', 'well', 'cough']),
    ...(random.chance(0.25) ? { preOxygenated: 'yes' as const } : {}),
  }
  return [draft(innerCannulaActs, at, data)]
}

/** Every other renewal may have found some coating; two in a row would suggest a shorter interval. */
function coated({ story, random }: Bedside): InnerCannulaData['condition'] {
  if (story.secretions === 'thin') return 'light'
  return random.chance(story.secretions === 'thick' ? 0.8 : 0.25) ? 'moderate' : 'light'
}

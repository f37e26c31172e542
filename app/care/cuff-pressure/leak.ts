import { earlier, hours } from '../../time/duration.ts'
import type { CareContext } from '../kind.ts'
import { cameAgain } from '../standing.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { LOCAL_PLAN, type Warning } from '../warning.ts'
import { type CuffEntry, cuffState } from './cuff.ts'
import { type CuffData, cuffChecks, foundCmH2O, leftCmH2O } from './schema.ts'
import { cuffTopUpCount, cuffTopUpMl, cuffTopUpWindow, cuffUpper } from './settings.ts'

const TEACHING = 'Red flag in teaching texts (NHS Wales, RCEM learning)'
const GLASGOW = 'NHS Greater Glasgow and Clyde: medical advice before more air when it leaks at the limit'

/** How often air was added within the window of the policy, and how much in all (mL, where it was charted). */
interface TopUps {
  readonly times: number
  readonly ml: number
}

/** What a leak, or air added again and again, asks people to notice as it is charted. */
export function leakWarnings(data: CuffData, context: CareContext): readonly Warning[] {
  const before = topUpsSoFar(context)
  const all = isTopUp(data) ? { times: before.times + 1, ml: before.ml + addedMl(data) } : before
  return [...leak(data, all, context), ...(isTopUp(data) ? tooMuchAir(all, context) : [])]
}

/** The same from what is charted; `look` is the last one at the cuff, and a leak then is judged as of then. */
export function standingLeakWarnings(look: CuffEntry | undefined, context: CareContext): readonly Warning[] {
  const window = hours(context.values.of(cuffTopUpWindow))
  const then = look && topUpsSoFar({ ...context, now: look.performedAt })
  return [
    ...(look && then ? leak(look.data, then, context) : []),
    ...tooMuchAir(sumOf(cameAgain(topUpsOnTube(context), window, context)), context),
  ]
}

function leak(data: CuffData, topUps: TopUps, context: CareContext): readonly Warning[] {
  if (data.leak !== 'yes' || data.cuffNow === 'deflated' || !mayLeak(context)) return []
  if (isRepeated(topUps, context)) {
    return [
      {
        name: 'cuff-leak-displacement',
        level: 'red',
        action: `Check the tube position now. The tube or cuff may have moved or failed. Call for help. ${LOCAL_PLAN}`,
        cause: `Leak or voice with the cuff up. ${addedWords(topUps, context)}`,
        source: TEACHING,
      },
    ]
  }
  const left = leftCmH2O(data)
  if (left !== undefined && left >= context.values.of(cuffUpper)) return [leakAtLimit(left, context)]
  return [
    {
      name: 'cuff-leak',
      level: 'amber',
      action: 'Check tube position and pilot line now, and tell the charge nurse.',
      cause: 'Leak or voice with the cuff up: the tube may have moved, or the cuff may have failed.',
      source: TEACHING,
    },
  ]
}

/** Only a cuff that is meant to seal can be said to leak. */
function mayLeak({ record }: CareContext): boolean {
  return !['no tube', 'no cuff', 'foam'].includes(cuffState(record))
}

function leakAtLimit(left: number, { values }: CareContext): Warning {
  return {
    name: 'cuff-leak-at-limit',
    level: 'amber',
    action: 'Do not add more air. Ask a doctor for a review of tube size and position.',
    cause: `It still leaks at ${Math.round(left)} cmH2O; the upper limit is ${values.of(cuffUpper)}.`,
    source: GLASGOW,
  }
}

function tooMuchAir(topUps: TopUps, context: CareContext): readonly Warning[] {
  if (!isRepeated(topUps, context)) return []
  return [
    {
      name: 'cuff-repeated-leak',
      level: 'amber',
      action: 'Do not add more air. Ask a doctor for a review of tube size and position.',
      cause: addedWords(topUps, context),
      source: cuffTopUpCount.source.says,
    },
  ]
}

/** Both limits are looked at, whichever is reached: "why?" names what was looked at. */
function isRepeated({ times, ml }: TopUps, { values }: CareContext): boolean {
  const [mostTimes, mostMl] = [values.of(cuffTopUpCount), values.of(cuffTopUpMl)]
  return times >= mostTimes || ml > mostMl
}

function addedWords({ times, ml }: TopUps, { values }: CareContext): string {
  const often = times === 1 ? 'once' : `${times} times`
  return `Air added ${often} within ${values.of(cuffTopUpWindow)} hours${ml > 0 ? `, ${ml} mL in all` : ''}.`
}

/** Air added to a cuff that was up. Inflating one that was let down is not. */
function isTopUp(data: CuffData): boolean {
  if (data.cuffNow !== undefined || data.reason === 'inflation') return false
  const found = foundCmH2O(data)
  const left = leftCmH2O(data)
  return addedMl(data) > 0 || (found !== undefined && left !== undefined && left > found)
}

function addedMl({ airMl }: CuffData): number {
  return Math.max(0, airMl ?? 0)
}

function topUpsSoFar(context: CareContext): TopUps {
  const from = earlier(context.now, hours(context.values.of(cuffTopUpWindow)))
  return sumOf(topUpsOnTube(context).filter(({ performedAt }) => performedAt >= from && performedAt <= context.now))
}

function topUpsOnTube({ record }: CareContext): readonly CuffEntry[] {
  const tube = tubeInPlace(record)
  const checks = tube ? record.since(cuffChecks, tube.performedAt) : record.of(cuffChecks)
  return checks.filter(({ data }) => isTopUp(data))
}

function sumOf(added: readonly CuffEntry[]): TopUps {
  return { times: added.length, ml: added.reduce((sum, { data }) => sum + addedMl(data), 0) }
}

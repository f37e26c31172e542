import { BLEED_ACTION } from '../emergency.ts'
import type { CareContext } from '../kind.ts'
import { stomaAgeDays } from '../tube-change/tube.ts'
import type { Warning } from '../warning.ts'
import { bleedWindowFrom, bleedWindowTo, streaksAreRed } from './bleeding-settings.ts'
import type { Blood } from './secretions.ts'

/**
 * Blood seen at suction or on an inner cannula. Fresh blood is red on any day; within the bleed window the cause says what it may
 * herald, and streaks, otherwise amber, may be raised to red by policy.
 */
export function bleedWarnings(name: string, blood: Blood | undefined, context: CareContext): readonly Warning[] {
  if (blood === undefined || blood === 'none') return []
  const day = dayInWindow(context)
  const isStreaks = blood === 'streaks'
  const isRed = !isStreaks || (day !== undefined && context.values.of(streaksAreRed))
  return [
    {
      name,
      level: isRed ? 'red' : 'amber',
      action: isRed ? BLEED_ACTION : 'Ask a doctor to see the patient this shift.',
      cause: bleedCause(seen[blood], context),
      source: bleedWindowTo.source.says,
    },
  ]
}

const seen = { streaks: 'Streaks of blood', fresh: 'Fresh blood', heavy: 'Heavy bleeding' } as const

/** What was seen, and within the bleed window the day after the opening was made and what a bleed then may herald. */
export function bleedCause(seenWords: string, context: CareContext): string {
  const day = dayInWindow(context)
  if (day === undefined) return `${seenWords}.`
  return `${seenWords} on day ${day} after the opening was made; until day ${context.values.of(bleedWindowTo)} a bleed may warn of a larger one.`
}

/** The day since the opening was made when it lies within the window; an opening of unknown age is taken to be in neither. */
function dayInWindow(context: CareContext): number | undefined {
  const day = stomaAgeDays(context)
  if (day === undefined) return undefined
  return day >= context.values.of(bleedWindowFrom) && day <= context.values.of(bleedWindowTo) ? day : undefined
}

import type { CareContext } from '../kind.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { cannulaType } from './acts.ts'

/** Line and size as the record has them for the tube in place: the inner cannula has to be made for it. */
export function innerCannulaStart({ record }: CareContext): Readonly<Record<string, unknown>> {
  const tube = tubeInPlace(record)?.data
  return tube?.construction === 'dual' ? { line: tube.line, size: tube.size } : {}
}

const usualAct = {
  disposable: { words: 'Replaced with new', act: 'replaced' },
  reusable: { words: 'Swapped for the clean spare', act: 'swapped' },
} as const

/**
 * The usual act for this tube. The tap that chooses it says every answer it gives, so nothing is preset unseen; the condition
 * is left out, because it has no usual. An act as usual stays within four taps from the board.
 */
export function usualInnerCannula(context: CareContext) {
  const tube = tubeInPlace(context.record)
  const type = tube?.data.construction === 'dual' ? cannulaType(tube, context.record) : undefined
  if (!type) return undefined
  const { words, act } = usualAct[type]
  return {
    words: `${words}, locked, spare at the bedside, tolerated well`,
    answers: { ...innerCannulaStart(context), act, locked: 'yes', spare: 'yes', tolerance: 'well' },
  }
}

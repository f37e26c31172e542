import type { CareContext } from '../kind.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { cannulaType } from './acts.ts'
import { pairState } from './pair.ts'
import { otherPlaces } from './schema.ts'

/** Line and size as the record has them for the tube in place: the inner cannula has to be made for it. */
export function innerCannulaStart({ record }: CareContext): Readonly<Record<string, unknown>> {
  const tube = tubeInPlace(record)?.data
  return tube?.construction === 'dual' ? { line: tube.line, size: tube.size } : {}
}

/**
 * The usual act for this tube. The tap that chooses it says every answer it gives, so nothing is preset unseen; the condition
 * is left out, because it has no usual. An act as usual stays within four taps from the board. A swap needs a clean spare to swap for.
 */
export function usualInnerCannula(context: CareContext) {
  const { record } = context
  const tube = tubeInPlace(record)
  const type = tube?.data.construction === 'dual' ? cannulaType(tube, record) : undefined
  if (!type) return undefined
  const { words, answers } =
    type === 'disposable' ? replacing : pairState(record)?.other === 'ready' ? swapping : cleaning
  return { words, answers: { ...innerCannulaStart(context), ...answers, locked: 'yes', tolerance: 'well' } }
}

const replacing = {
  words: 'Replaced with new, locked, spare at the bedside, tolerated well',
  answers: { act: 'replaced', spare: 'yes' },
}
const swapping = {
  words: 'Swapped for the clean spare, the other to be cleaned, locked, further spare at the bedside, tolerated well',
  answers: { act: 'swapped', spare: 'yes', other: 'cleaning' },
}
const cleaning = {
  words: 'Cleaned and put back, locked, tolerated well',
  answers: { act: 'cleaned' },
}

/** A single-use cannula is never offered to be cleaned, and a reusable one is not found used again. */
export function notOfferedOfCannula({ record }: CareContext): Readonly<Record<string, readonly string[]>> {
  const tube = tubeInPlace(record)
  const type = tube && cannulaType(tube, record)
  if (type === 'disposable') {
    return { act: ['cleaned', 'swapped', 'other only'], other: Object.keys(otherPlaces) }
  }
  return type === 'reusable' ? { foundReused: ['yes', 'no'] } : {}
}

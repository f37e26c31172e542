import type { LocalDay } from '../time/zone.ts'
import { GROUP_SEPARATOR, type Gs1Element, type Gs1Symbol, readElements } from './gs1.ts'
import { ownLength } from './gs1-elements.ts'

/**
 * Suspicion that a scanner left out the separator after the value of `ai`, so that it swallowed what follows it: "123ABC17271231" may
 * be lot 123ABC with an expiry date. `readings` are the parts it may stand for, the likeliest first; a person must read the label.
 */
export interface SeparatorMissing {
  readonly ai: string
  readonly readings: readonly (readonly Gs1Element[])[]
}

const SWALLOWED = ['10', '11', '17', '21']
const MOST_READINGS = 5

/**
 * Whether the last value of a code may hold more than one part, and which; null when it can not. GS1's own engine accepts such a code,
 * because nothing in it is wrong. Only for scans without a single separator: a scanner that sends one sends all.
 */
export function separatorMissing(symbol: Gs1Symbol, today: LocalDay): SeparatorMissing | null {
  const last = symbol.elements.at(-1)
  const unseparated = symbol.form === 'element string' && !symbol.raw.includes(GROUP_SEPARATOR, 1)
  if (!last || !unseparated || ownLength(last.ai) !== null) return null
  const taken = symbol.elements.map(({ ai }) => ai)
  const readings = partings(last, taken, today).sort((a, b) => dates(b) - dates(a) || a.length - b.length)
  return readings.length > 0 ? { ai: last.ai, readings: readings.slice(0, MOST_READINGS) } : null
}

/** Every way to part a value into itself and parts after it which the code does not have yet. */
function partings(whole: Gs1Element, taken: readonly string[], today: LocalDay): (readonly Gs1Element[])[] {
  return Array.from({ length: whole.value.length - 1 }, (_, i) => i + 1).flatMap(head => {
    const rest = readElements(whole.value, head, today)
    if (!rest.ok) return []
    const parts = rest.elements.map(part => ({ ...part, at: whole.at + part.at }))
    const known = [...taken, ...parts.map(({ ai }) => ai)]
    const last = parts.at(-1)
    if (!last || new Set(known).size < known.length || !parts.every(({ ai }) => SWALLOWED.includes(ai))) return []
    const before = [{ ...whole, value: whole.value.slice(0, head) }, ...parts.slice(0, -1)]
    const deeper = ownLength(last.ai) === null ? partings(last, known, today) : []
    return [[last], ...deeper].map(ending => [...before, ...ending])
  })
}

function dates(reading: readonly Gs1Element[]): number {
  return reading.filter(({ ai }) => ai === '11' || ai === '17').length
}

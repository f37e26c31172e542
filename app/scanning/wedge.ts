import { GROUP_SEPARATOR } from '#app/clinical/gs1.ts'

/** A key as the browser tells of it; `atMs` counts from anywhere. */
export interface Key {
  readonly key: string
  readonly ctrl: boolean
  readonly atMs: number
}

/** Keys that came faster than fingers are. */
export interface Burst {
  readonly text: string
  readonly lastMs: number
}

/** What follows from a key: the burst so far, a whole scan, and whether the key is kept from whatever has the focus. */
export interface Struck {
  readonly burst: Burst | null
  readonly scan: string | null
  readonly isKept: boolean
}

// Scanners that act as keyboards send a key every few milliseconds; the fastest typists need more than 60.
const LONGEST_GAP_MS = 35
const SHORTEST_SCAN = 6
const SURELY_A_SCANNER = 3
const LONGEST_BURST = 2000
const HELD = ['Shift', 'Control', 'Alt', 'AltGraph', 'CapsLock', 'NumLock', 'Meta']

/** Goes on with a key. A scan ends with Enter or Tab; `separatorKey` is what this scanner sends for the group separator, besides Ctrl+]. */
export function struck(burst: Burst | null, key: Key, separatorKey: string | null): Struck {
  const going = burst && key.atMs - burst.lastMs <= LONGEST_GAP_MS ? burst : null
  if (HELD.includes(key.key)) return { burst: going, scan: null, isKept: false }
  if (key.key === 'Enter' || key.key === 'Tab') {
    const isScan = going !== null && going.text.length >= SHORTEST_SCAN
    return { burst: null, scan: isScan ? going.text : null, isKept: isScan }
  }
  const character = characterOf(key, separatorKey)
  if (character === null) return { burst: null, scan: null, isKept: false }
  const text = (going?.text ?? '') + character
  if (text.length > LONGEST_BURST) return { burst: null, scan: null, isKept: true }
  const isKept = text.length > SURELY_A_SCANNER || (character === GROUP_SEPARATOR && going !== null)
  return { burst: { text, lastMs: key.atMs }, scan: null, isKept }
}

function characterOf({ key, ctrl }: Key, separatorKey: string | null): string | null {
  if (key === GROUP_SEPARATOR || key === separatorKey || (ctrl && key === ']')) return GROUP_SEPARATOR
  return key.length === 1 && !ctrl ? key : null
}

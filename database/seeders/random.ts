/** Numbers that look random and are not: the same seed gives the same ones in the same order. */
export interface Random {
  /** From `low` up to `high`, `high` left out. */
  between(low: number, high: number): number
  /** A whole number from `low` to `high`, both included. */
  whole(low: number, high: number): number
  chance(share: number): boolean
  /** One of a list that is not empty. */
  pick<const T>(list: readonly [T, ...T[]]): T
}

/** A small generator of 32 bits (mulberry32): plenty for invented data, of no use for secrets. */
export function randomFrom(seed: string): Random {
  let state = hashOf(seed)
  const next = (): number => {
    state = (state + 0x6d2b79f5) | 0
    let mixed = Math.imul(state ^ (state >>> 15), state | 1)
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32
  }
  const whole = (low: number, high: number) => low + Math.floor(next() * (high - low + 1))
  return {
    between: (low, high) => low + next() * (high - low),
    whole,
    chance: share => next() < share,
    pick: list => list[whole(0, list.length - 1)] ?? list[0],
  }
}

/** FNV-1a over the characters of a text. */
function hashOf(text: string): number {
  let hash = 0x811c9dc5
  for (const character of text) hash = Math.imul(hash ^ (character.codePointAt(0) ?? 0), 0x01000193)
  return hash
}

/** An id in the form of a UUIDv7: ids of later moments sort after those of earlier ones. */
export function idAt(at: Date, random: Random): string {
  const time = at.getTime().toString(16).padStart(12, '0')
  const digits = (count: number) =>
    random
      .whole(0, 16 ** count - 1)
      .toString(16)
      .padStart(count, '0')
  const variant = random.pick(['8', '9', 'a', 'b'])
  return `${time.slice(0, 8)}-${time.slice(8)}-7${digits(3)}-${variant}${digits(3)}-${digits(6)}${digits(6)}`
}

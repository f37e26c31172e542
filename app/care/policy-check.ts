import type { AnySetting, Setting, SettingValue, Values } from './policy.ts'

/** Two or more settings that must fit together, such as a lower limit below its upper one. */
export interface PolicyCheck {
  readonly settings: readonly AnySetting[]
  /** What is wrong, in words with the values; undefined when they fit. */
  problem(values: Values): string | undefined
}

/** The first number must be smaller than the second. */
export function below(lower: Setting<number>, upper: Setting<number>): PolicyCheck {
  return ordered(lower, upper, (a, b) => a < b, 'must be below')
}

/** The first number must not be larger than the second. */
export function atMost(lower: Setting<number>, upper: Setting<number>): PolicyCheck {
  return ordered(lower, upper, (a, b) => a <= b, 'must be at most')
}

function ordered(
  one: Setting<number>,
  other: Setting<number>,
  fits: (a: number, b: number) => boolean,
  words: string,
): PolicyCheck {
  return {
    settings: [one, other],
    problem(values) {
      const [a, b] = [values.of(one), values.of(other)]
      const named = (setting: AnySetting, value: SettingValue) =>
        `"${values.judged(setting).label}" (${String(value)} ${setting.unit})`
      return fits(a, b) ? undefined : `${named(one, a)} ${words} ${named(other, b)}`
    },
  }
}

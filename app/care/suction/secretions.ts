import { choice } from '../field.ts'

const amounts = { none: 'None', scant: 'Scant', small: 'Small', moderate: 'Moderate', copious: 'Copious' } as const

const colours = {
  clear: 'Clear',
  tan: 'Tan',
  yellow: 'Yellow',
  green: 'Green',
  brown: 'Brown, old blood',
  feed: 'Like feed or food',
} as const

const consistencies = { thin: 'Thin', moderate: 'Moderate', thick: 'Thick', tenacious: 'Tenacious' } as const

const bloods = { none: 'None', streaks: 'Streaks', fresh: 'Fresh blood', heavy: 'Heavy bleeding' } as const

type Extra = Omit<Parameters<typeof choice>[0], 'label' | 'options'>

/** How much came out, on the plain ward list. */
export const amountField = (extra: Extra) => choice({ label: 'Amount', options: amounts, ...extra })

/** Colours as in the Airway Care Score (Critical Care 2008, table 1); old blood and feed are flags outside the score. */
export const colourField = (extra: Extra) => choice({ label: 'Colour', options: colours, ...extra })

/** Thin rinses clear, moderate clings and rinses off, thick stays after a rinse (Suzukawa, from memory). */
export const consistencyField = (extra: Extra) => choice({ label: 'Consistency', options: consistencies, ...extra })

/** Blood is asked apart from colour, since green secretions may be streaked too. */
export const bloodField = (extra: Extra) => choice({ label: 'Blood', options: bloods, ...extra })

export type Blood = keyof typeof bloods

export interface Secretions {
  readonly amount?: keyof typeof amounts | undefined
  readonly colour?: keyof typeof colours | undefined
  readonly consistency?: keyof typeof consistencies | undefined
  readonly blood?: Blood | undefined
}

/** `Secretions moderate, yellow, thick.` `No blood.`: one sentence for each that was charted. */
export function secretionSentences({ amount, colour, consistency, blood }: Secretions): readonly string[] {
  const words = [
    amount && amounts[amount],
    colour && colours[colour],
    consistency && (consistency === 'moderate' ? 'moderately thick' : consistencies[consistency]),
  ].filter(word => word !== undefined)
  return [
    ...(words.length > 0
      ? [amount === 'none' ? 'No secretions.' : `Secretions ${words.join(', ').toLowerCase()}.`]
      : []),
    ...(blood && blood !== 'none' ? [blood === 'streaks' ? 'Streaks of blood.' : `${bloods[blood]}.`] : []),
  ]
}

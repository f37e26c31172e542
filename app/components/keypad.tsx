import type { RefObject } from 'react'
import { typeInto } from './type-into.ts'

export interface KeypadProps {
  readonly input: RefObject<HTMLInputElement | null>
  readonly decimals: boolean
  /** What the number is, for those who hear the keys. */
  readonly label: string
}

const DIGITS = ['1', '2', '3', '4', '5', '6', '7', '8', '9']
const KEY =
  'flex min-h-16 items-center justify-center rounded-control border border-edge bg-surface text-2xl font-semibold hover:bg-sunk active:bg-brand-tint'

/** Large keys beside a large number, for gloves. Only where scripts run; the input itself takes any keyboard. */
export function Keypad({ input, decimals, label }: KeypadProps) {
  const type = (change: (text: string) => string) => () => {
    if (input.current) typeInto(input.current, change(input.current.value))
  }
  return (
    <fieldset
      aria-label={`Keys for ${label}`}
      className="hidden w-72 grid-cols-3 gap-2 self-start md:scripted:grid print:hidden"
    >
      {DIGITS.map(digit => (
        <button key={digit} type="button" className={KEY} onClick={type(text => text + digit)}>
          {digit}
        </button>
      ))}
      {decimals ? (
        <button type="button" className={KEY} onClick={type(text => (text.includes('.') ? text : `${text}.`))}>
          <span aria-hidden="true">.</span>
          <span className="sr-only">Point</span>
        </button>
      ) : (
        <button type="button" className={`${KEY} text-lg`} onClick={type(() => '')}>
          Clear
        </button>
      )}
      <button type="button" className={KEY} onClick={type(text => `${text}0`)}>
        0
      </button>
      <button type="button" className={KEY} onClick={type(text => text.slice(0, -1))}>
        <svg aria-hidden="true" viewBox="0 0 28 20" className="h-5 w-7 fill-none stroke-current stroke-2">
          <path d="M9 1h18v18H9L1 10zM13 6l8 8M21 6l-8 8" strokeLinejoin="round" />
        </svg>
        <span className="sr-only">Delete last</span>
      </button>
    </fieldset>
  )
}

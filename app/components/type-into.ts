type Field = HTMLInputElement | HTMLTextAreaElement

const prototypeValue = (input: Field) => Object.getOwnPropertyDescriptor(Object.getPrototypeOf(input), 'value')

/**
 * Writes a text into an input as if it had been typed. React keeps its own setter on each input and takes a change through it for
 * its own, so the prototype's setter is used and the event is sent by hand.
 */
export function typeInto(input: Field, text: string): void {
  prototypeValue(input)?.set?.call(input, text)
  input.dispatchEvent(new Event('input', { bubbles: true }))
}

import type { Typed } from '#app/charting/chart-form.ts'
import { typeInto } from './type-into.ts'

/** Answers a form as if somebody had tapped and typed; what is already answered otherwise is answered anew. */
export function fillForm(form: HTMLFormElement, answers: Typed): void {
  for (const element of form.elements) {
    if (!(element instanceof HTMLInputElement)) continue
    const values = answers[element.name]
    if (!values) continue
    if (element.dataset.carried !== undefined) carry(element, values[0] ?? '')
    else if (element.type === 'radio' || element.type === 'checkbox') tap(element, values.includes(element.value))
    else typeInto(element, values[0] ?? '')
  }
}

function tap(box: HTMLInputElement, isChosen: boolean): void {
  if (box.checked === isChosen) return
  box.checked = isChosen
  box.dispatchEvent(new Event('input', { bubbles: true }))
}

/** A box that carries what a scan found stands for it, and is there as long as it does. */
function carry(box: HTMLInputElement, value: string): void {
  box.value = value
  box.checked = value !== ''
  box.dispatchEvent(new Event('input', { bubbles: true }))
}

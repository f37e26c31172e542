import { useEffect, useRef } from 'react'
import { type Burst, struck } from '#app/scanning/wedge.ts'
import { typeInto } from './type-into.ts'

/**
 * Listens to a scanner that types like a keyboard, wherever the focus is. The few keys that reach a field before they are known
 * to come from a scanner are taken back out of it. Ctrl+] puts nothing into a field, so keys are read and not the field.
 */
export function useWedge(onScan: (raw: string) => void, separatorKey: string | null): void {
  const heard = useRef(onScan)
  useEffect(() => {
    heard.current = onScan
  })
  useEffect(() => {
    let burst: Burst | null = null
    let before: { readonly field: HTMLInputElement | HTMLTextAreaElement; readonly value: string } | null = null
    const onKey = (event: KeyboardEvent) => {
      const next = struck(burst, { key: event.key, ctrl: event.ctrlKey, atMs: event.timeStamp }, separatorKey)
      if (next.isKept) event.preventDefault()
      if (next.burst?.text.length === 1) before = focusedField()
      burst = next.burst
      if (next.scan === null) return
      event.stopPropagation()
      if (before && before.field.value !== before.value) typeInto(before.field, before.value)
      heard.current(next.scan)
    }
    document.addEventListener('keydown', onKey, { capture: true })
    return () => document.removeEventListener('keydown', onKey, { capture: true })
  }, [separatorKey])
}

function focusedField() {
  const field = document.activeElement
  const isField = field instanceof HTMLInputElement || field instanceof HTMLTextAreaElement
  return isField ? { field, value: field.value } : null
}

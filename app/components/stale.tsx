import { showTime } from '#app/time/display.ts'
import type { Zone } from '#app/time/zone.ts'

export interface StaleProps {
  /** When the page was last known to be right; null while it is. */
  readonly since: Date | null
  readonly zone: Zone
}

/** Says that a live page has stopped being live. Always in the document, so that its change is read out. */
export function Stale({ since, zone }: StaleProps) {
  return (
    <div role="status" aria-live="polite" className="print:hidden">
      {since && (
        <p className="mb-3 rounded-control border border-due bg-due-tint px-4 py-2 font-semibold text-due">
          Not up to date since {showTime(since, zone)}. Trying again.
        </p>
      )}
    </div>
  )
}

import { useEffect, useRef, useState } from 'react'
import { showTime } from '#app/time/display.ts'
import type { Zone } from '#app/time/zone.ts'
import { Button } from './button.tsx'
import { handIn } from './hand-in.ts'

export interface IdleWatchProps {
  /** How long a session lasts that nobody uses, and how long before its end the page says so. */
  readonly idleMinutes: number
  readonly warningMinutes: number
  /** The server's clock now, and when the session ends whatever is done. */
  readonly now: Date
  readonly endsAt: Date
  readonly zone: Zone
}

const CHECK_MS = 5000
const REPORT_MS = 60_000
const EARLY_MS = 15_000 // before the server's own end, so that the session can still hand in what was typed
const signs = ['pointerdown', 'keydown', 'wheel', 'touchstart'] as const

type Warning = { readonly at: Date; readonly canStay: boolean }

/**
 * Tells the server that somebody is using the page, warns two minutes before a session ends, and at its end hands in
 * what was typed and leaves. Without scripts the server does the same at the next request.
 */
export function IdleWatch(props: IdleWatchProps) {
  const { warning, stay } = useIdleWatch(props)
  if (warning === null) return null
  return (
    <div
      role="alert"
      className="fixed inset-x-4 bottom-20 z-40 mx-auto grid max-w-xl gap-3 rounded-card border-2 border-due bg-surface p-4 shadow-float md:bottom-6 print:hidden"
    >
      <p>
        <b className="font-semibold">You will be signed out at {showTime(warning.at, props.zone)}.</b>{' '}
        {warning.canStay ? 'Nobody has used this page for a while.' : 'A session lasts twelve hours at most.'} What you
        have typed is kept for you until you sign in again.
      </p>
      {warning.canStay && (
        <Button type="button" variant="primary" size={48} onClick={stay}>
          Stay signed in
        </Button>
      )}
    </div>
  )
}

function useIdleWatch({ idleMinutes, warningMinutes, now, endsAt }: IdleWatchProps) {
  const [warning, setWarning] = useState<Warning | null>(null)
  const report = useRef<() => void>(() => {})
  // Kept over a change of page, which the server does not count: only what is reported counts.
  const used = useRef({ at: 0, isUnreported: false })
  const [idleMs, warningMs, serverNow, serverEnd] = [idleMinutes * 60_000, warningMinutes * 60_000, +now, +endsAt]

  useEffect(() => {
    const ahead = serverNow - Date.now() // of this device's clock
    const end = serverEnd - ahead
    const pages = new BroadcastChannel('cannulary-activity')
    const seen = () => {
      used.current = { at: Date.now(), isUnreported: false }
      setWarning(null)
    }
    const tell = async () => {
      if (!(await isHeard())) return
      seen()
      pages.postMessage('seen')
    }
    const check = async () => {
      const { at, isUnreported } = used.current
      const last = Math.min(at + idleMs, end)
      if (isUnreported && Date.now() - at >= REPORT_MS) return tell()
      if (Date.now() < last - warningMs) return
      setWarning({ at: new Date(last + ahead), canStay: last < end })
      if (Date.now() >= last - EARLY_MS && !(await handIn(last < end))) seen()
    }
    if (used.current.at === 0) seen()
    report.current = () => void tell()
    pages.onmessage = seen
    const stop = watched(check, () => Object.assign(used.current, { isUnreported: true }))
    return () => {
      pages.close()
      stop()
    }
  }, [idleMs, warningMs, serverNow, serverEnd])

  return { warning, stay: () => report.current() }
}

/** Calls `check` every few seconds, one at a time, and `use` when somebody does something; returns what ends both. */
function watched(check: () => Promise<void>, use: () => void): () => void {
  let isChecking = false
  const timer = window.setInterval(() => {
    if (isChecking) return
    isChecking = true
    void check().finally(() => {
      isChecking = false
    })
  }, CHECK_MS)
  for (const sign of signs) window.addEventListener(sign, use, { passive: true })
  return () => {
    window.clearInterval(timer)
    for (const sign of signs) window.removeEventListener(sign, use)
  }
}

/** Whether the server has heard that somebody is here. Without a network nothing ends early: the next check asks again. */
async function isHeard(): Promise<boolean> {
  const answer = await fetch('/still-here', { method: 'POST' }).catch(() => null)
  return answer?.ok ?? false
}

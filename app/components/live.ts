import { useEffect, useRef, useState } from 'react'

export interface Live<Data> {
  readonly data: Data
  /** The server's clock (ms), moving with the quarter minute. */
  readonly now: number
  /** Since when (ms) the server has not answered; null while it does. */
  readonly staleSince: number | null
}

interface Served<Data> {
  readonly data: Data
  readonly etag: string
  /** The server's clock (ms) when this was served. */
  readonly at: number
}

const REFRESH_MS = 60_000
const TICK_MS = 15_000

/**
 * Keeps what a page was served up to date: asks `url` every minute and whenever the page is looked at again, and
 * takes new data only when its ETag changed. `now` follows the server's clock, so that lateness grows between answers.
 * A session that has ended leads to the sign-in page.
 */
export function useLive<Data>(url: string, served: Served<Data>): Live<Data> {
  const [latest, setLatest] = useState(served)
  const [staleSince, setStaleSince] = useState<number | null>(null)
  const now = useServerClock(served.at)
  const etag = useRef(served.etag)
  const offset = useRef(0)

  useEffect(() => {
    offset.current = served.at - Date.now()
    etag.current = served.etag
    setLatest(served)
    setStaleSince(null)
  }, [served])

  useEffect(() => {
    let answeredAt = Date.now()
    return onEveryLook(async signal => {
      const answer = await ask<Data>(url, etag.current, signal)
      if (signal.aborted) return
      if (answer.kind === 'gone') return setStaleSince(since => since ?? answeredAt + offset.current)
      if (answer.kind === 'signed out') return window.location.reload()
      answeredAt = Date.now()
      setStaleSince(null)
      if (answer.kind === 'new') {
        etag.current = answer.served.etag
        setLatest(answer.served)
      }
    })
  }, [url])

  return { data: latest.data, now, staleSince }
}

/** Refreshes every minute while the page is looked at, and when it is looked at again; returns how to end that. */
function onEveryLook(refresh: (signal: AbortSignal) => Promise<void>): () => void {
  const ending = new AbortController()
  const look = () => {
    if (document.visibilityState === 'visible') void refresh(ending.signal)
  }
  const timer = window.setInterval(look, REFRESH_MS)
  document.addEventListener('visibilitychange', look, { signal: ending.signal })
  window.addEventListener('focus', look, { signal: ending.signal })
  window.addEventListener('online', look, { signal: ending.signal })
  return () => {
    window.clearInterval(timer)
    ending.abort()
  }
}

/** The server's clock, carried on by this device's: a wrong device clock does not matter, only its pace. */
function useServerClock(servedAt: number): number {
  const [now, setNow] = useState(servedAt)
  useEffect(() => {
    const offset = servedAt - Date.now()
    setNow(servedAt)
    const timer = window.setInterval(() => setNow(Date.now() + offset), TICK_MS)
    return () => window.clearInterval(timer)
  }, [servedAt])
  return now
}

type Answer<Data> =
  | { readonly kind: 'new'; readonly served: Served<Data> }
  | { readonly kind: 'same' }
  | { readonly kind: 'signed out' }
  | { readonly kind: 'gone' }

async function ask<Data>(url: string, etag: string, signal: AbortSignal): Promise<Answer<Data>> {
  try {
    const response = await fetch(url, { headers: { 'If-None-Match': etag }, signal, cache: 'no-store' })
    if (response.status === 304) return { kind: 'same' }
    if (response.status === 401 || response.status === 404) return { kind: 'signed out' }
    if (!response.ok) return { kind: 'gone' }
    const body: { data: Data; at: number } = await response.json()
    return { kind: 'new', served: { ...body, etag: response.headers.get('etag') ?? '' } }
  } catch {
    // The network or the server is gone: the page says since when, and asks again.
    return { kind: 'gone' }
  }
}

import { useEffect, useState } from 'react'
import { localTime, type Zone } from '#app/time/zone.ts'

export interface ClockProps {
  /** The server's time; the device's own clock may be wrong. */
  readonly now: Date
  readonly zone: Zone
  readonly className?: string
}

/** The ward's time. It moves on by how long the page has been open, not by the clock of the device. */
export function Clock({ now, zone, className = '' }: ClockProps) {
  const [shown, setShown] = useState(now)
  useEffect(() => {
    const openedAt = performance.now()
    setShown(now)
    const timer = setInterval(() => setShown(new Date(now.getTime() + performance.now() - openedAt)), 5000)
    return () => clearInterval(timer)
  }, [now])
  return (
    <time dateTime={shown.toISOString()} className={`font-semibold ${className}`}>
      {localTime(shown, zone)}
    </time>
  )
}

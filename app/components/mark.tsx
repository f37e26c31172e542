interface MarkProps {
  readonly className?: string
}

/** The mark: a neck plate from the front, two wings with their slots, the ring and the bore. */
export function Mark({ className = 'h-6 w-12' }: MarkProps) {
  return (
    <svg viewBox="0 0 48 24" className={className} fill="none" stroke="currentColor" strokeWidth="2" aria-hidden="true">
      <path d="M17 7.5C12.5 5 8 4.2 5 5.2 2.4 6.1 1.5 9 1.5 12s.9 5.9 3.5 6.8c3 1 7.5.2 12-2.3M31 7.5c4.5-2.5 9-3.3 12-2.3 2.6.9 3.5 3.8 3.5 6.8s-.9 5.9-3.5 6.8c-3 1-7.5.2-12-2.3" />
      <path d="M7 9.5v5M41 9.5v5" strokeWidth="2.5" strokeLinecap="round" />
      <circle cx="24" cy="12" r="9" />
      <circle cx="24" cy="12" r="4" fill="currentColor" stroke="none" />
    </svg>
  )
}

/** Mark and name side by side. */
export function Wordmark() {
  return (
    <span className="inline-flex items-center gap-2.5 text-xl font-bold tracking-tight text-brand">
      <Mark />
      Cannulary
    </span>
  )
}

import type { ReactNode } from 'react'

export interface EmptyProps {
  readonly title: string
  /** What to do about it, or why that is right. */
  readonly children?: ReactNode
}

/** Nothing to show, said plainly. */
export function Empty({ title, children }: EmptyProps) {
  return (
    <div className="px-4 py-10 text-center">
      <p className="text-lg font-semibold">{title}</p>
      {children && <div className="mt-1.5 text-ink2">{children}</div>}
    </div>
  )
}

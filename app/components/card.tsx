import type { ReactNode } from 'react'

export interface CardProps {
  readonly title?: string
  /** Beside the title: a tag, a short line, a button. */
  readonly aside?: ReactNode
  /** Rows that run to the edges instead of a padded text. */
  readonly flush?: boolean
  readonly id?: string
  readonly className?: string
  readonly children: ReactNode
}

/** A titled part of a page. */
export function Card({ title, aside, flush = false, id, className = '', children }: CardProps) {
  return (
    <section
      id={id}
      className={`rounded-card border border-line bg-surface ${flush ? 'overflow-hidden' : 'p-4'} ${className}`}
    >
      {(title || aside) && (
        <div
          className={`flex flex-wrap items-center justify-between gap-x-4 gap-y-1 ${flush ? 'px-4 pt-3 pb-2' : 'mb-3'}`}
        >
          {title && <h2 className="text-lg">{title}</h2>}
          {aside && <div className="text-sm text-ink2">{aside}</div>}
        </div>
      )}
      {children}
    </section>
  )
}

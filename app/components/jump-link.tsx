import type { MouseEvent, ReactNode } from 'react'

interface JumpLinkProps {
  /** Id of an element of the page. */
  readonly to: string
  readonly className: string
  readonly children: ReactNode
}

/**
 * A link within the page. With scripts it moves the focus alone: as a navigation of the router it would take the answer to a
 * form, and with it every mistake that is named, off the page.
 */
export function JumpLink({ to, className, children }: JumpLinkProps) {
  return (
    <a href={`#${to}`} onClick={jump} className={className}>
      {children}
    </a>
  )
}

function jump(event: MouseEvent<HTMLAnchorElement>): void {
  const target = document.getElementById(event.currentTarget.hash.slice(1))
  if (!target) return
  event.preventDefault()
  target.focus()
  if (document.activeElement !== target) target.scrollIntoView()
}

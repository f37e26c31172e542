import { LinkButton } from './button.tsx'

export interface PagerProps {
  readonly newer?: string | undefined
  readonly older?: string | undefined
  /** What is paged, for those who hear it: "Timeline". */
  readonly label: string
}

/** Newer and older, where there is more. */
export function Pager({ newer, older, label }: PagerProps) {
  if (!newer && !older) return null
  return (
    <nav aria-label={`${label}, pages`} className="flex justify-between gap-3 p-4 print:hidden">
      {newer ? <LinkButton href={newer}>Newer</LinkButton> : <span />}
      {older && <LinkButton href={older}>Older</LinkButton>}
    </nav>
  )
}

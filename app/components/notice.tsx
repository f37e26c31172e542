import type { ReactNode } from 'react'
import type { WarningLevel } from '#app/care/warning.ts'

export interface NoticeProps {
  readonly tone: WarningLevel
  /** What to do, first and bold. */
  readonly action: string
  /** Why, in one or two sentences. */
  readonly children?: ReactNode
  /** A button or link that answers it. */
  readonly answer?: ReactNode
}

const tones: Readonly<Record<WarningLevel, string>> = {
  red: 'border-late bg-late-tint [&_svg,&_b]:text-late',
  amber: 'border-due bg-due-tint [&_svg,&_b]:text-due',
  blue: 'border-soon bg-surface [&_svg,&_b]:text-soon',
}
/** Read before the action, and told apart by shape: a full triangle, a hollow diamond, a circle. */
const levels: Readonly<Record<WarningLevel, { says: string; shape: ReactNode }>> = {
  red: {
    says: 'Act now',
    shape: (
      <>
        <path d="M12 2.5L23 21.5H1z" fill="currentColor" strokeLinejoin="round" />
        <path d="M12 9v6M12 17.2v1.6" className="stroke-late-tint" />
      </>
    ),
  },
  amber: {
    says: 'Act this hour',
    shape: (
      <>
        <path d="M12 1.5L22.5 12 12 22.5 1.5 12z" strokeLinejoin="round" />
        <path d="M12 7v6M12 15.2v1.6" />
      </>
    ),
  },
  blue: {
    says: 'Note and plan',
    shape: (
      <>
        <circle cx="12" cy="12" r="10" />
        <path d="M12 7.2v1.6M12 11v6" />
      </>
    ),
  },
}

/** Something to act on, calmly: the action first, then the reason. */
export function Notice({ tone, action, children, answer }: NoticeProps) {
  const { says, shape } = levels[tone]
  return (
    <div className={`flex gap-3 rounded-card border p-3 ${tones[tone]}`}>
      <svg
        viewBox="0 0 24 24"
        className="mt-0.5 size-6 flex-none fill-none stroke-current stroke-2"
        role="img"
        aria-label={`${says}.`}
      >
        {shape}
      </svg>
      <div className="min-w-0 flex-1">
        <p>
          <b className="font-semibold">{action}</b> {children}
        </p>
        {answer && <div className="mt-2 flex flex-wrap gap-2">{answer}</div>}
      </div>
    </div>
  )
}

import { LinkButton } from './button.tsx'
import { Notice } from './notice.tsx'

interface CompetenceRemindersProps {
  /** `Tube change, performing: the sign-off runs out on 12-Dec-2026.` */
  readonly reminders: readonly string[]
  /** Where the sign-offs are; absent on that page. */
  readonly href?: string
}

/** Sign-offs that somebody is to have assessed again, before they run out. */
export function CompetenceReminders({ reminders, href }: CompetenceRemindersProps) {
  if (reminders.length === 0) return null
  return (
    <div className="mb-3">
      <Notice
        tone="blue"
        action="Arrange an assessment."
        answer={href && <LinkButton href={href}>Your sign-offs</LinkButton>}
      >
        {reminders.join(' ')}
      </Notice>
    </div>
  )
}

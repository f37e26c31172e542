import type { ReactNode } from 'react'
import { Button, LinkButton } from './button.tsx'

export interface FinalBarProps {
  /** The sentence that will be charted, as far as it can be said yet; null before scripts run, or with nothing to say. */
  readonly sentence: string | null
  /** What is still needed for a sentence, or wrong with it. */
  readonly missing?: string | undefined
  /** What to do about it, while the reason for it may be out of sight further up. */
  readonly notice?: ReactNode
  /** `Chart pressure` */
  readonly words: string
  readonly cancelHref?: string
  /** Being sent: pressing again would do nothing new. */
  readonly busy?: boolean
  /** A second button, such as the usual act as one tap. */
  readonly children?: ReactNode
}

/** The foot of a form: what will be charted, and the act itself. Sticks to the foot of the screen, above a keyboard. */
export function FinalBar({ sentence, missing, notice, words, cancelHref, busy = false, children }: FinalBarProps) {
  return (
    <div
      data-final-bar
      className="sticky bottom-0 z-10 mt-6 border-t border-line bg-surface px-4 py-3 pb-[max(0.75rem,env(safe-area-inset-bottom))] md:px-6 print:hidden"
    >
      {notice}
      <div className="flex flex-wrap items-center justify-end gap-x-6 gap-y-2">
        <p
          id="will-be-charted"
          // biome-ignore lint/a11y/noNoninteractiveTabindex: on a phone a long sentence scrolls, by keyboard too.
          tabIndex={0}
          className="min-w-0 flex-1 basis-64 max-md:max-h-20 max-md:overflow-y-auto"
        >
          {sentence !== null && (
            <>
              <span className="text-ink2">Will be charted as: </span>
              <b className="font-semibold">{sentence}</b>
            </>
          )}
          {sentence === null && missing && <span className="text-ink2">{missing}</span>}
        </p>
        <div className="flex flex-1 justify-end gap-3 md:flex-none">
          {cancelHref && (
            <LinkButton href={cancelHref} size={56}>
              Cancel
            </LinkButton>
          )}
          {children}
          <Button
            variant="primary"
            size={56}
            aria-describedby="will-be-charted"
            aria-disabled={busy || undefined}
            className="max-md:flex-1"
          >
            {busy ? 'Charting' : words}
          </Button>
        </div>
      </div>
    </div>
  )
}

import { useNavigation } from 'react-router'
import type { FormSigner } from '#app/charting/chart-answer.ts'
import type { LiveSentence } from '#app/charting/sentence.ts'
import type { ExplainedWarning } from '#app/rules/why-warnings.ts'
import { Button } from './button.tsx'
import { FinalBar } from './final-bar.tsx'
import { useHydrated } from './hydrated.ts'
import { JumpLink } from './jump-link.tsx'

interface ChartBarProps {
  readonly words: string
  readonly cancelHref: string
  readonly signer: FormSigner
  readonly warnings: readonly ExplainedWarning[]
  readonly live: LiveSentence | null
  readonly reviewed: string | undefined
}

const NAMED = 4 // a phone has room for so many beside the buttons

/** The foot of a chart form: the sentence it becomes or what is still needed for one, and the most urgent warning. */
export function ChartBar({ words, cancelHref, signer, warnings, live, reviewed }: ChartBarProps) {
  const isBusy = useNavigation().formMethod === 'POST'
  const isHydrated = useHydrated()
  const sentence = live?.ready ? live.says : live ? null : (reviewed ?? null)
  const missing = live && !live.ready ? missingWords(live) : `Signed by ${signer.name}, ${signer.role}.`
  return (
    <FinalBar {...{ sentence, missing, words, cancelHref }} busy={isBusy} notice={<BarNotice warnings={warnings} />}>
      {/* The first button of a form is the one that Enter presses, so it is gone where it is not needed. */}
      {!isHydrated && (
        <Button name="intent" value="review" size={56} className="hidden unscripted:inline-flex">
          Check first
        </Button>
      )}
    </FinalBar>
  )
}

/** The most urgent act, in sight whatever part of the form is; the whole warning is a tap away. */
function BarNotice({ warnings }: { readonly warnings: readonly ExplainedWarning[] }) {
  const [first, ...others] = warnings.filter(({ level }) => level !== 'blue')
  if (!first) return null
  const more = others.length > 0 ? ` And ${others.length} more.` : ''
  return (
    <p className={`font-semibold ${first.level === 'red' ? 'text-late' : 'text-due'}`}>
      <JumpLink to="notices" className="flex min-h-11 items-center underline decoration-1 underline-offset-3">
        <span className="line-clamp-2">
          {first.action}
          {more}
        </span>
      </JumpLink>
    </p>
  )
}

function missingWords({ needed, wrong }: LiveSentence & { ready: false }): string {
  if (wrong !== undefined) return `${wrong}.`.replace(/\.\.$/, '.')
  const rest = needed.length - NAMED
  return `Still needed: ${needed.slice(0, NAMED).join(', ')}${rest > 0 ? ` and ${rest} more` : ''}.`
}

import { Form } from 'react-router'
import { wordsOf } from '#app/care/kind.ts'
import { warningAnswers } from '#app/care/warning-answer/schema.ts'
import type { AnswerView, StandingView } from '#app/rules/standing-views.ts'
import type { WhyByName } from '#app/rules/why-warnings.ts'
import { momentWords } from '#app/rules/words.ts'
import type { Zone } from '#app/time/zone.ts'
import { Button, LinkButton } from './button.tsx'
import { Notice } from './notice.tsx'
import { WhyDetails } from './why.tsx'

/** Who may answer, and under which ids: one for each warning, so that a button pressed twice is one answer. */
export interface Answering {
  readonly patientId: string
  readonly userId: string
  /** The moment (ISO 8601, UTC) that the page shows as now. */
  readonly at: string
  readonly ids: Readonly<Record<string, string>>
}

interface StandingWarningsProps {
  readonly warnings: readonly StandingView[]
  /** Why each stands, by its name. */
  readonly why: WhyByName
  /** The server's clock (ms). */
  readonly now: number
  readonly zone: Zone
  /** Null for those who only read. */
  readonly answering: Answering | null
}

/** What stands, most urgent first, with who has seen it and what was done; what is settled stays in sight, small. */
export function StandingWarnings({ warnings, why, now, zone, answering }: StandingWarningsProps) {
  const open = warnings.filter(({ settled }) => settled === null)
  const settled = warnings.filter(warning => warning.settled !== null)
  if (warnings.length === 0) return null
  return (
    <section aria-label="Warnings" className="grid gap-2">
      {open.map(warning => (
        <Notice
          key={warning.name}
          tone={warning.level}
          action={warning.action}
          answer={
            <>
              <p className="w-full text-sm">{lifeWords(warning, now, zone)}</p>
              {answering && <AnswerButtons warning={warning} answering={answering} />}
              <Reasons why={why[warning.name]} about={wordsOf(warning.name)} />
            </>
          }
        >
          {warning.cause}
        </Notice>
      ))}
      {settled.map(({ name, action, settled: answer }) => (
        <p key={name} className="rounded-card border border-line bg-surface px-4 py-2 text-sm text-ink2">
          <b className="font-semibold">{action}</b> Settled {answer && answerWords(answer, now, zone)}
        </p>
      ))}
    </section>
  )
}

function Reasons({ why, about }: { readonly why: WhyByName[string] | undefined; readonly about: string }) {
  return why ? <WhyDetails why={why} about={about} /> : null
}

/** `Raised 10:04 by R. Osei. Seen by N. Adeyemi, 10:06.` */
function lifeWords({ raised, seen, acted, risesAt }: StandingView, now: number, zone: Zone): string {
  const began = raised ? `Raised ${momentWords(raised.at, now, zone)} by ${raised.by}. ` : ''
  const looked = seen ? `Seen by ${seen.by}, ${momentWords(seen.at, now, zone)}.` : ''
  const waits = !seen && risesAt !== null && risesAt <= now ? 'Nobody has answered it yet.' : ''
  const done = acted.map(answer => ` Acted on ${answerWords(answer, now, zone)}`).join('')
  return `${began}${looked}${waits}${done}`
}

function answerWords({ by, at, words }: AnswerView, now: number, zone: Zone): string {
  return `by ${by}, ${momentWords(at, now, zone)}${words ? `: ${words}` : '.'}`
}

interface AnswerButtonsProps {
  readonly warning: Pick<StandingView, 'name' | 'action' | 'seen'>
  readonly answering: Answering
}

function AnswerButtons({ warning: { name, action, seen }, answering }: AnswerButtonsProps) {
  const form = `/patients/${answering.patientId}/chart/${warningAnswers.slug}?warning=${name}`
  return (
    <>
      {!seen && <SeenButton name={name} about={action} answering={answering} />}
      <LinkButton href={form} label={`Chart what was done: ${action}`}>
        Chart what was done
      </LinkButton>
    </>
  )
}

interface SeenButtonProps {
  readonly name: string
  /** The warning in words, for those who hear the button alone. */
  readonly about: string
  readonly answering: Answering
  readonly size?: 44 | 56
}

/** Charts in one tap that this person has seen the warning. Nothing while the page holds no id for it, as for one that has just come. */
export function SeenButton({ name, about, answering, size = 44 }: SeenButtonProps) {
  const id = answering.ids[name]
  if (id === undefined) return null
  const fields = {
    id,
    openedBy: answering.userId,
    at: answering.at,
    when: 'now',
    'care.warning': name,
    'care.answer': 'seen',
  }
  return (
    <Form method="post" action={`/patients/${answering.patientId}/chart/${warningAnswers.slug}`}>
      {Object.entries(fields).map(([field, value]) => (
        <input key={field} type="hidden" name={field} value={value} />
      ))}
      <Button variant="primary" size={size} aria-label={`Seen: ${about}`}>
        Seen
      </Button>
    </Form>
  )
}

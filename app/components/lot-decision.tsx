import { Form } from 'react-router'
import { Button } from './button.tsx'
import { Card } from './card.tsx'
import { ErrorSummary } from './error-summary.tsx'
import { TextField } from './text-field.tsx'

type Texts = Readonly<Record<string, unknown>>

interface LotDecisionProps {
  /** Minted with the page: the same form sent twice is one decision. */
  readonly id: string
  readonly lot: string
  readonly isRecalled: boolean
  readonly answer: { readonly errors: Readonly<Record<string, string[] | null>>; readonly typed: Texts }
}

/** Recalls a lot, or lifts its recall. What was decided before stays readable. */
export function LotDecision({ id, lot, isRecalled, answer: { errors, typed } }: LotDecisionProps) {
  const textOf = (name: string) => (typeof typed[name] === 'string' ? typed[name] : '')
  const problems = Object.entries(errors).flatMap(([name, messages]) =>
    (messages ?? []).map(says => (name === 'line' || name === 'reason' ? { fieldId: name, says } : { says })),
  )
  return (
    <Card title={isRecalled ? 'Lift the recall' : 'Recall this lot'}>
      <Form method="post" noValidate className="grid gap-3">
        <ErrorSummary title="Nothing was kept. Please check:" errors={problems} />
        <input type="hidden" name="id" value={id} />
        <input type="hidden" name="lot" value={lot} />
        <input type="hidden" name="decision" value={isRecalled ? 'lift' : 'recall'} />
        <TextField
          id="line"
          name="line"
          label="Only of this line"
          hint="Leave empty for every line"
          optional
          maxLength={120}
          defaultValue={textOf('line')}
          errors={errors.line ?? undefined}
        />
        <TextField
          id="reason"
          name="reason"
          label="Reason"
          hint={isRecalled ? 'Who says that it may be used again' : 'What is wrong, and where the notice came from'}
          maxLength={500}
          defaultValue={textOf('reason')}
          errors={errors.reason ?? undefined}
        />
        <Button variant={isRecalled ? 'plain' : 'danger'} size={48} className="justify-self-start">
          {isRecalled ? 'Lift the recall' : 'Recall this lot'}
        </Button>
      </Form>
    </Card>
  )
}

import { Form } from 'react-router'
import { Button } from './button.tsx'
import { ErrorSummary } from './error-summary.tsx'
import { linesOf, OwnPassword, type RefusedSignOff } from './sign-off-form.tsx'
import { TextField } from './text-field.tsx'

interface HistoryProps {
  readonly lines: readonly {
    readonly id: string
    readonly skill: string
    readonly says: string
    readonly withdrawn: string | null
    readonly mayWithdraw: boolean
  }[]
  readonly email: string
  readonly refused: RefusedSignOff | undefined
}

/** Every sign-off of a person; one that was withdrawn stays readable, struck through. */
export function SignOffHistory({ lines, email, refused }: HistoryProps) {
  if (lines.length === 0) return <p className="p-4 text-ink2">Nothing has been signed off yet.</p>
  return (
    <ol>
      {lines.map(({ id, skill, says, withdrawn, mayWithdraw }) => (
        <li key={id} className="border-t border-hair px-4 py-3 first:border-0">
          <p className={withdrawn ? 'line-through decoration-1' : ''}>
            <b className="font-semibold">{skill}.</b> {says}
          </p>
          {withdrawn && <p className="text-sm text-ink2">{withdrawn}</p>}
          {mayWithdraw && (
            <Withdrawal {...{ id, skill, email }} refused={refused?.typed.id === id ? refused : undefined} />
          )}
        </li>
      ))}
    </ol>
  )
}

interface WithdrawalProps {
  readonly id: string
  readonly skill: string
  readonly email: string
  readonly refused: RefusedSignOff | undefined
}

function Withdrawal({ id, skill, email, refused }: WithdrawalProps) {
  const errors = refused?.errors ?? {}
  return (
    <details open={refused !== undefined}>
      <summary className="inline-flex min-h-11 items-center font-semibold text-brand underline underline-offset-3">
        Withdraw<span className="sr-only">{` ${skill}`}</span>
      </summary>
      <Form method="post" noValidate className="mt-2 grid gap-4">
        <input type="hidden" name="id" value={id} />
        {refused && (
          <ErrorSummary
            title="Not withdrawn yet. Please check:"
            errors={linesOf(errors).map(({ says }) => ({ says }))}
          />
        )}
        <TextField
          id={`reason-${id}`}
          name="reason"
          label="Why it is withdrawn"
          maxLength={500}
          defaultValue={refused?.typed.reason}
          errors={errors.reason}
        />
        <OwnPassword id={`password-${id}`} email={email} errors={errors.signerPassword} />
        <div>
          <Button name="intent" value="withdraw" variant="danger">
            Withdraw
          </Button>
        </div>
      </Form>
    </details>
  )
}

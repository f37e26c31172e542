import { fieldsOf } from '#app/care/field.ts'
import type { AnyCareKind } from '#app/care/kind.ts'
import type { FormErrors } from '#app/charting/assess.ts'
import type { ChartAnswer } from '#app/charting/chart-answer.ts'
import { LinkButton } from './button.tsx'
import { ErrorSummary, type FormError } from './error-summary.tsx'

/** The id of a field by the name it is submitted under. */
export const fieldId = (name: string): string => name.replace('.', '-')

interface ChartErrorsProps {
  readonly kind: AnyCareKind
  readonly answer: ChartAnswer | undefined
}

/** Why a form was not charted, in the order of the form, with what explains it. */
export function ChartErrors({ kind, answer }: ChartErrorsProps) {
  if (answer?.is === 'unavailable') return <ErrorSummary title="Not charted." errors={[{ says: answer.says }]} />
  if (answer?.is !== 'refused') return null
  return (
    <div className="grid gap-3">
      <ErrorSummary title={answer.title} errors={inOrder(kind, answer.errors)} />
      {answer.see && (
        <div>
          <LinkButton href={answer.see.href}>{answer.see.words}</LinkButton>
        </div>
      )}
    </div>
  )
}

const onceOnly = [
  '',
  'reason',
  'when',
  'day',
  'time',
  'occurrence',
  'witness',
  'witnessPassword',
  'signerPassword',
  'unsigned',
]

function inOrder(kind: AnyCareKind, errors: FormErrors): readonly FormError[] {
  const drawn = [...fieldsOf(kind.schema).map(({ name }) => `care.${name}`), ...onceOnly]
  const others = Object.keys(errors).filter(name => !drawn.includes(name))
  return [...drawn, ...others].flatMap(name =>
    (errors[name] ?? []).map(says =>
      name === '' || others.includes(name) ? { says } : { fieldId: fieldId(name), says },
    ),
  )
}

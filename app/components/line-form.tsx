import { Form } from 'react-router'
import { Button } from './button.tsx'
import { ErrorSummary } from './error-summary.tsx'
import { TextField } from './text-field.tsx'

interface LineFormProps {
  readonly line: { readonly line: string; readonly maker: string }
  /** What was typed and what is wrong with it, by field; '' for the whole form. */
  readonly reply: {
    readonly initialValue?: Readonly<Record<string, unknown>> | null
    readonly error?: Readonly<Record<string, string[] | null>> | null
  } | null
}

const fields = [
  ['line', 'Line', 'As printed on the flange. Care that was charted keeps the name it was charted with.'],
  ['maker', 'Maker', undefined],
] as const

/** Name and maker of a line, for all of its items. */
export function LineForm({ line, reply }: LineFormProps) {
  const errors = reply?.error ?? {}
  const typed = (name: 'line' | 'maker') => {
    const value = reply?.initialValue?.[name]
    return typeof value === 'string' ? value : reply ? '' : line[name]
  }
  const summary = Object.entries(errors).flatMap(([name, messages]) =>
    (messages ?? []).map(says => (name === 'line' || name === 'maker' ? { fieldId: name, says } : { says })),
  )
  return (
    <Form method="post" noValidate className="grid max-w-3xl gap-4">
      <ErrorSummary title="Not saved yet. Please check:" errors={summary} />
      <input type="hidden" name="wasLine" value={line.line} />
      <input type="hidden" name="wasMaker" value={line.maker} />
      {fields.map(([name, label, hint]) => (
        <TextField
          key={name}
          id={name}
          name={name}
          label={label}
          hint={hint}
          maxLength={80}
          defaultValue={typed(name)}
          errors={errors[name] ?? undefined}
          autoComplete="off"
        />
      ))}
      <Button variant="primary" size={48} className="justify-self-start">
        Save for the whole line
      </Button>
    </Form>
  )
}

import { Form } from 'react-router'
import { levels } from '#app/care/skills.ts'
import { Button } from './button.tsx'
import { Card } from './card.tsx'
import { ChoiceField } from './choice-field.tsx'
import { ErrorSummary } from './error-summary.tsx'
import { SelectField, TextField } from './text-field.tsx'

export interface RefusedSignOff {
  readonly errors: Readonly<Record<string, readonly string[]>>
  readonly typed: Readonly<Record<string, string>>
}

interface SignOffFormProps {
  readonly id: string
  readonly email: string
  readonly today: string
  readonly assessable: Readonly<Record<string, string>>
  readonly refused: RefusedSignOff | undefined
}

/** An assessor signs a skill off, with their own password. */
export function SignOffForm({ id, email, today, assessable, refused }: SignOffFormProps) {
  const { errors = {}, typed = {} } = refused ?? {}
  return (
    <Card title="Sign a skill off">
      <Form key={id} method="post" noValidate className="grid gap-4">
        <input type="hidden" name="id" value={id} />
        {refused && <ErrorSummary title="Not signed yet. Please check:" errors={linesOf(errors)} />}
        <SelectField
          id="skill"
          name="skill"
          label="Skill"
          options={assessable}
          nothing="Choose"
          defaultValue={typed.skill}
          errors={errors.skill}
        />
        <ChoiceField
          id="level"
          name="level"
          label="Level"
          options={levels}
          chosen={typed.level === undefined ? [] : [typed.level]}
          errors={errors.level}
        />
        <TextField
          id="assessedOn"
          name="assessedOn"
          label="Assessed on"
          type="date"
          max={today}
          defaultValue={typed.assessedOn ?? today}
          errors={errors.assessedOn}
        />
        <OwnPassword id="signerPassword" email={email} errors={errors.signerPassword} />
        <div>
          <Button name="intent" value="sign off" variant="primary" size={48}>
            Sign off
          </Button>
        </div>
      </Form>
    </Card>
  )
}

interface OwnPasswordProps {
  readonly id: string
  readonly email: string
  readonly errors: readonly string[] | undefined
}

/** The signer's own password, once more. */
export function OwnPassword({ id, email, errors }: OwnPasswordProps) {
  return (
    <>
      <input type="text" autoComplete="username" value={email} readOnly hidden />
      <TextField
        id={id}
        name="signerPassword"
        label="Your own password"
        hint="You sign with it"
        type="password"
        autoComplete="current-password"
        errors={errors}
      />
    </>
  )
}

/** The lines of the summary, each leading to its field. */
export function linesOf(errors: RefusedSignOff['errors']) {
  return Object.entries(errors).flatMap(([name, messages]) =>
    messages.map(says => (name === '' || name === 'id' ? { says } : { fieldId: name, says })),
  )
}

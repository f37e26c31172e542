import { type Ref, useEffect, useRef } from 'react'
import type { FormErrors } from '#app/charting/assess.ts'
import type { FormSigner } from '#app/charting/chart-answer.ts'
import type { Typed } from '#app/charting/chart-form.ts'
import { SelectField, TextField } from './text-field.tsx'

const SUMMARY = 'inline-flex min-h-11 items-center font-semibold text-brand underline underline-offset-3'

interface SecondPersonProps {
  readonly typed: Typed
  readonly errors: FormErrors
  readonly witnesses: Readonly<Record<string, string>>
  readonly ask: 'offered' | 'asked' | 'expected'
  /** Changes with each answer of the server: a password does not outlive one. */
  readonly answer: unknown
}

const hints = {
  offered: undefined,
  asked: 'Dressings, ties and tubes are changed by two people.',
  expected: 'Dressings, ties and tubes are changed by two people: on this ward the second one signs here.',
} as const

/** Who checked or helped, and their own signature on the same screen. */
export function SecondPerson({ typed, errors, witnesses, ask, answer }: SecondPersonProps) {
  const password = useForgotten(answer)
  if (Object.keys(witnesses).length === 0) return null
  const chosen = typed.witness?.[0]
  const isOpen = ask !== 'offered' || chosen !== undefined || errors.witness || errors.witnessPassword
  return (
    <details open={Boolean(isOpen)}>
      <summary className={SUMMARY}>Second person</summary>
      <div className="mt-2 grid gap-4">
        <SelectField
          id="witness"
          name="witness"
          label="Who checked or helped"
          hint={hints[ask]}
          optional
          options={witnesses}
          nothing="Nobody"
          defaultValue={chosen}
          errors={errors.witness}
        />
        <Password
          inside={password}
          name="witnessPassword"
          label="Their own password"
          hint="The second person signs with it. Left empty, the entry says that you named them."
          // Not `new-password`: beside the signer's it would look like a change of password, and browsers offer to keep it.
          autoComplete="one-time-code"
          optional
          errors={errors.witnessPassword}
        />
      </div>
    </details>
  )
}

interface OwnSignatureProps {
  readonly signer: FormSigner
  readonly email: string
  readonly typed: Typed
  readonly errors: FormErrors
  readonly answer: unknown
}

/** A final act is signed anew by whoever charts it, with a way on for those who cannot. */
export function OwnSignature({ signer, email, typed, errors, answer }: OwnSignatureProps) {
  const password = useForgotten(answer)
  const isUnsigned = typed.unsigned?.[0] === 'yes'
  return (
    <fieldset className="grid gap-2 border-t border-hair pt-5">
      <legend className="float-left mb-2 font-semibold">Sign this act</legend>
      <input type="text" autoComplete="username" value={email} readOnly hidden />
      <Password
        inside={password}
        name="signerPassword"
        label={`Password of ${signer.name}`}
        hint="Asked for again, because this cannot be undone at the bedside."
        autoComplete="current-password"
        errors={errors.signerPassword}
      />
      <details open={isUnsigned || errors.signerPassword !== undefined}>
        <summary className={SUMMARY}>You cannot give it now?</summary>
        <label className="flex min-h-11 items-center gap-3">
          <input type="checkbox" name="unsigned" value="yes" defaultChecked={isUnsigned} className="size-5 flex-none" />
          Chart without the password. The entry will say so.
        </label>
      </details>
    </fieldset>
  )
}

interface PasswordProps {
  readonly inside: Ref<HTMLDivElement>
  readonly name: string
  readonly label: string
  readonly hint: string
  readonly autoComplete: string
  readonly optional?: boolean
  readonly errors: readonly string[] | undefined
}

function Password({ inside, name, ...field }: PasswordProps) {
  return (
    <div ref={inside}>
      <TextField {...field} id={name} name={name} type="password" spellCheck={false} autoCapitalize="none" />
    </div>
  )
}

/** Empties the password inside whenever the server has answered: it is typed for one sending. */
function useForgotten(answer: unknown) {
  const inside = useRef<HTMLDivElement>(null)
  useEffect(() => {
    if (answer === undefined) return
    const input = inside.current?.querySelector('input')
    if (input) input.value = ''
  }, [answer])
  return inside
}

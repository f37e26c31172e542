import { type ChangeEvent, useEffect, useState } from 'react'
import { useNavigation } from 'react-router'
import { PHOTOGRAPH_LIMITS, PHOTOGRAPH_TYPES, photographWords } from '#app/care/photographs.ts'
import { describedBy, type FieldProps, HintAndErrors, INPUT, isInvalid, LabelWords } from './field-parts.tsx'
import { useHydrated } from './hydrated.ts'

interface PhotographsFieldProps extends FieldProps {
  readonly most: number
  /** Photographs that the entry has already, by id: each can be kept or left out. */
  readonly kept: readonly string[]
}

interface Chosen {
  readonly name: string
  readonly address: string
}

/** Photographs to send with the form: files, with what they show once scripts run, and those that the entry has already. */
export function PhotographsField({ most, kept, ...field }: PhotographsFieldProps) {
  const hydrated = useHydrated()
  const { chosen, leftOut, choose } = useChosen(most)
  const isSending = useNavigation().state === 'submitting' && chosen.length > 0
  return (
    <div className="grid gap-3">
      {kept.length > 0 && <Kept ids={kept} {...field} />}
      <div className="grid gap-1.5">
        <label htmlFor={field.id}>
          <LabelWords field={field} />
        </label>
        <input
          id={field.id}
          name={field.name}
          type="file"
          accept={PHOTOGRAPH_TYPES}
          multiple
          disabled={field.disabled}
          onChange={choose}
          aria-describedby={describedBy(field, `${field.id}-limits`)}
          aria-invalid={isInvalid(field)}
          className={`${INPUT} max-w-xl`}
        />
        <p id={`${field.id}-limits`} className="text-sm text-ink2">
          {`JPEG, PNG or WebP, at most ${most}, 8 MB each. What the camera noted in the file, such as the place, is not kept.`}
          {!hydrated && ' Choose them last: after a message, or after Check first, they have to be chosen again.'}
        </p>
        {leftOut.length > 0 && (
          <p role="alert" className="font-semibold text-late">
            {`Not chosen, larger than 8 MB or more than ${most}: ${leftOut.join(', ')}.`}
          </p>
        )}
        <HintAndErrors field={field} />
      </div>
      {chosen.length > 0 && (
        <ul aria-label="Chosen photographs" className="flex flex-wrap gap-3">
          {chosen.map(({ name, address }) => (
            <li key={address}>
              <img src={address} alt={name} className="size-24 rounded-control border border-line object-cover" />
            </li>
          ))}
        </ul>
      )}
      {isSending && (
        <p role="status" className="flex items-center gap-3">
          <progress aria-label="Sending" className="h-2 w-40" />
          {`Sending ${photographWords(chosen.length)}.`}
        </p>
      )}
    </div>
  )
}

/** What was chosen, as the browser can show it. A file too large or too many is not sent at all, and said at once. */
function useChosen(most: number) {
  const [chosen, setChosen] = useState<readonly Chosen[]>([])
  const [leftOut, setLeftOut] = useState<readonly string[]>([])
  useEffect(
    () => () => {
      for (const { address } of chosen) URL.revokeObjectURL(address)
    },
    [chosen],
  )
  const choose = ({ target }: ChangeEvent<HTMLInputElement>) => {
    const files = [...(target.files ?? [])]
    const taken = files.filter(({ size }) => size <= PHOTOGRAPH_LIMITS.bytes).slice(0, most)
    const rest = files.filter(file => !taken.includes(file))
    if (rest.length > 0) {
      const transfer = new DataTransfer()
      for (const file of taken) transfer.items.add(file)
      target.files = transfer.files
    }
    setLeftOut(rest.map(({ name }) => name))
    setChosen([...(target.files ?? [])].map(file => ({ name: file.name, address: URL.createObjectURL(file) })))
  }
  return { chosen, leftOut, choose }
}

interface KeptProps {
  readonly ids: readonly string[]
  readonly id: string
  readonly name: string
}

function Kept({ ids, id, name }: KeptProps) {
  return (
    <fieldset>
      <legend className="mb-1.5 font-semibold">Photographs of this entry</legend>
      <div className="flex flex-wrap gap-3">
        {ids.map((photograph, index) => (
          <label key={photograph} className="grid justify-items-center gap-1">
            <img
              src={`/photographs/${photograph}?size=small`}
              alt={`Photograph ${index + 1}`}
              className="size-24 rounded-control border border-line object-cover"
            />
            <span className="inline-flex min-h-11 items-center gap-2">
              <input
                id={`${id}-kept-${index}`}
                type="checkbox"
                name={name}
                value={photograph}
                defaultChecked
                className="size-6"
              />
              Keep
            </span>
          </label>
        ))}
      </div>
    </fieldset>
  )
}

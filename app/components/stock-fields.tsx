import { Form } from 'react-router'
import { Button, LinkButton } from './button.tsx'
import { TextField } from './text-field.tsx'

interface FindItemProps {
  readonly find: string
  /** How many the words found; null where nothing was looked for. */
  readonly found: number | null
  readonly longest: number
}

/** Adds tubes and inner cannulas of the catalogue to the list to choose from: it has too many to list them all. */
export function FindItem({ find, found, longest }: FindItemProps) {
  return (
    <Form method="get" role="search" className="grid gap-3">
      <TextField
        id="find"
        name="find"
        label="Find a tube or an inner cannula"
        hint="By line or size, such as Corvane 8.0. What this ward has is on the list already."
        defaultValue={find}
        maxLength={longest}
        autoComplete="off"
      />
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
        <Button>Find</Button>
        <LinkButton href="/scan">Scan one that came</LinkButton>
        {found !== null && <p role="status">{foundWords(found)}</p>}
      </div>
    </Form>
  )
}

function foundWords(found: number): string {
  if (found === 0) return 'Nothing of the catalogue is called so.'
  return `${found} found: choose ${found === 1 ? 'it' : 'one'} under Item.`
}

import { Form } from 'react-router'
import { Button } from './button.tsx'
import { TextField } from './text-field.tsx'

interface FindItemProps {
  readonly find: string
  readonly longest: number
}

/** Adds tubes and inner cannulas of the catalogue to the list to choose from: it has too many to list them all. */
export function FindItem({ find, longest }: FindItemProps) {
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
      <Button className="justify-self-start">Find</Button>
    </Form>
  )
}

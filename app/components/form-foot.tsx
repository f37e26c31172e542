import { Button, LinkButton } from './button.tsx'

interface FormFootProps {
  /** What is done: `Discharge`. */
  readonly words: string
  /** Where cancelling leads. */
  readonly back: string
  readonly variant?: 'primary' | 'danger'
}

/** The foot of a form that changes something for good: do it, or leave it. */
export function FormFoot({ words, back, variant = 'primary' }: FormFootProps) {
  return (
    <div className="flex flex-wrap gap-3">
      <Button variant={variant} size={56}>
        {words}
      </Button>
      <LinkButton href={back} size={56}>
        Cancel
      </LinkButton>
    </div>
  )
}

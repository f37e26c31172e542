import { Notice } from './notice.tsx'

export interface OneTimePasswordProps {
  readonly name: string
  readonly password: string
  readonly hours: number
}

/** A password that is on screen this once: nothing keeps it. */
export function OneTimePassword({ name, password, hours }: OneTimePasswordProps) {
  return (
    <Notice tone="blue" action={`Give this one-time password to ${name}.`}>
      It works for {hours} hours, opens only the page on which they choose their own, and is not shown again.
      <output className="mt-2 block text-3xl font-bold tracking-wide select-all">{password}</output>
    </Notice>
  )
}

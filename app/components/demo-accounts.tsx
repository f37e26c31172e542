interface DemoAccountsProps {
  readonly accounts: readonly {
    readonly name: string
    readonly email: string
    readonly role: string
    readonly wardNames: readonly string[]
  }[]
  readonly passphrase: string
}

/** Who may sign in to the demo hospital. Never drawn once it is gone. */
export function DemoAccounts({ accounts, passphrase }: DemoAccountsProps) {
  if (accounts.length === 0) return null
  return (
    <section aria-labelledby="demo" className="border-t border-line pt-4">
      <h2 id="demo" className="text-lg font-bold">
        Demo hospital
      </h2>
      <p className="text-ink2">
        Invented people and patients. Password of every account: <b className="text-ink">{passphrase}</b>
      </p>
      <ul className="mt-2 grid gap-2">
        {accounts.map(({ name, email, role, wardNames }) => (
          <li key={email} className="[overflow-wrap:anywhere]">
            <b className="font-semibold">{email}</b>
            <span className="block text-sm text-ink2">
              {name}, {role}
              {wardNames.length > 0 && `, ${wardNames.join(', ')}`}
            </span>
          </li>
        ))}
      </ul>
    </section>
  )
}

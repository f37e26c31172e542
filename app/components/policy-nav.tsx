import { LinkButton } from './button.tsx'

interface PolicyNavProps {
  /** Without its query, such as `/policy`. */
  readonly page: string
  readonly wards: readonly { readonly id: string; readonly name: string }[]
  readonly ward: string
  readonly ruleSet: 'adults' | 'children'
}

const CHOSEN = 'aria-[current=page]:border-brand aria-[current=page]:bg-brand-tint aria-[current=page]:text-brand'

/** Which ward and which rule set a policy page is about. */
export function PolicyNav({ page, wards, ward, ruleSet }: PolicyNavProps) {
  const href = (to: string, set: string) => `${page}?ward=${to}${set === 'children' ? '&set=children' : ''}`
  return (
    <div className="flex flex-wrap gap-x-8 gap-y-2 print:hidden">
      {wards.length > 1 && (
        <nav aria-label="Wards" className="flex flex-wrap gap-2">
          {wards.map(({ id, name }) => (
            <LinkButton key={id} href={href(id, ruleSet)} current={id === ward} className={CHOSEN}>
              {name}
            </LinkButton>
          ))}
        </nav>
      )}
      <nav aria-label="Rule sets" className="flex flex-wrap gap-2">
        {(['adults', 'children'] as const).map(set => (
          <LinkButton key={set} href={href(ward, set)} current={set === ruleSet} className={CHOSEN}>
            Rules for {set}
          </LinkButton>
        ))}
      </nav>
    </div>
  )
}

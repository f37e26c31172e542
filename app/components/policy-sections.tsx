import type { Standing } from '#app/care/policy.ts'
import { LinkButton } from './button.tsx'
import { Card } from './card.tsx'
import { Tag, type TagTone } from './tag.tsx'

/** One setting of a version, in words. */
export interface PolicyLine {
  readonly name: string
  readonly label: string
  readonly value: string
  /** Set when it differs from the product's default. */
  readonly differsFrom: string | null
  /** `4 to 12 h`, of a number. */
  readonly range: string | null
  readonly affects: string
  readonly source: string
  readonly standing: Standing
  readonly personal: boolean
  readonly reviewed: boolean
}

export interface PolicySection {
  readonly id: string
  readonly title: string
  readonly lines: readonly PolicyLine[]
}

/** One version in the list of all that a ward had, has or will have. */
export interface VersionLine {
  readonly id: string
  readonly title: string
  readonly standing: 'coming' | 'in force' | 'earlier' | 'withdrawn'
  readonly says: string
  readonly reason: string
  readonly mayWithdraw: boolean
  /** The version before it, to compare with. */
  readonly before: string | null
}

interface PolicySectionsProps {
  readonly sections: readonly PolicySection[]
}

/** Every number of a policy in words, section by section. */
export function PolicySections({ sections }: PolicySectionsProps) {
  return sections.map(({ id, title, lines }) => (
    <Card key={id} id={id} title={title} flush className="scroll-mt-4">
      <dl>
        {lines.map(line => (
          <Line key={line.name} line={line} />
        ))}
      </dl>
    </Card>
  ))
}

function Line({ line }: { readonly line: PolicyLine }) {
  return (
    <div className="grid gap-x-6 gap-y-1 border-t border-hair px-4 py-3 first:border-0 md:grid-cols-[minmax(0,1fr)_10rem_minmax(0,1fr)]">
      <dt>
        <span className="font-semibold">{line.label}</span>
        <span className="block text-sm text-ink2">{line.affects}</span>
      </dt>
      <dd>
        <b className="text-lg font-bold">{line.value}</b>
        {line.differsFrom && <span className="block text-sm text-ink2">product default {line.differsFrom}</span>}
        {line.range && <span className="block text-sm text-ink2">allowed {line.range}</span>}
        {line.personal && <span className="block text-sm text-ink2">may be set for one patient</span>}
        {!line.reviewed && <Tag tone="due">not in the reviewed version</Tag>}
      </dd>
      <dd className="text-sm text-ink2">
        {line.source} <Tag>{line.standing}</Tag>
      </dd>
    </div>
  )
}

/** Links to the sections of a long page. */
export function JumpLinks({
  sections,
}: {
  readonly sections: readonly { readonly id: string; readonly title: string }[]
}) {
  return (
    <nav aria-label="Parts of the policy" className="flex flex-wrap gap-x-5 print:hidden">
      {sections.map(({ id, title }) => (
        <a
          key={id}
          href={`#${id}`}
          className="inline-flex min-h-11 min-w-11 items-center font-semibold text-brand underline"
        >
          {title}
        </a>
      ))}
    </nav>
  )
}

const tones: Readonly<Record<VersionLine['standing'], TagTone>> = {
  coming: 'soon',
  'in force': 'ok',
  earlier: 'plain',
  withdrawn: 'plain',
}

interface VersionsProps {
  readonly versions: readonly VersionLine[]
  /** The page of a ward and rule set, with its query. */
  readonly here: string
}

/** Every version there was, is or will be, latest start first. */
export function Versions({ versions, here }: VersionsProps) {
  return (
    <Card title="Versions" flush id="versions">
      <ul>
        {versions.map(({ id, title, standing, says, reason, mayWithdraw, before }) => (
          <li key={id} className="grid gap-1 border-t border-hair px-4 py-3 first:border-0">
            <p>
              <b className="font-semibold">{title}</b> <Tag tone={tones[standing]}>{standing}</Tag>
            </p>
            <p className="text-ink2">{says}</p>
            <p className="text-ink2">{reason}</p>
            <p className="flex flex-wrap gap-2">
              <LinkButton href={`${here}&version=${id}`} label={`Read ${title}`}>
                Read
              </LinkButton>
              {before && (
                <LinkButton
                  href={`${here.replace('/policy?', '/policy/compare?')}&from=${before}&to=${id}`}
                  label={`Compare with the one before, ${title}`}
                >
                  Compare with the one before
                </LinkButton>
              )}
              {mayWithdraw && (
                <LinkButton href={`/policy/versions/${id}/withdraw`} variant="danger" label={`Withdraw ${title}`}>
                  Withdraw
                </LinkButton>
              )}
            </p>
          </li>
        ))}
      </ul>
    </Card>
  )
}

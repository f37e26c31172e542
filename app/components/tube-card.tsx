import { tubeCautions } from '#app/care/tube-change/cautions.ts'
import type { TaskStatus } from '#app/rules/status.ts'
import type { TubeCardOrNone } from '#app/rules/tube-card.ts'
import { LinkButton } from './button.tsx'
import { Card } from './card.tsx'
import { DataList } from './data-list.tsx'
import { DwellBar } from './dwell-bar.tsx'
import { Flange } from './flange.tsx'
import { Notice } from './notice.tsx'

interface TubeCardProps {
  readonly tube: TubeCardOrNone
  /** How the tube's own change stands. */
  readonly status: TaskStatus
  /** Where the tube stands beside others of the catalogue. */
  readonly compareHref?: string
}

/** Which tube is in: drawn, so that it can be held against the neck, and in words with its dwell and cautions. */
export function TubeCard({ tube, status, compareHref }: TubeCardProps) {
  if ('none' in tube) return <Card title="Tube in place">{tube.none}</Card>
  return (
    <Card title="Tube in place">
      <Flange {...tube.plate} />
      <p className="mb-3 text-center text-sm text-ink2">Compare with the flange at the bedside</p>
      <DwellBar day={tube.day} limit={tube.limit} status={status} />
      <div className="mt-4">
        <DataList items={tube.facts.map(({ term, value }) => ({ label: term, value }))} />
      </div>
      {tube.newStoma && (
        <div className="mt-4">
          <Notice tone="blue" action="New stoma: do not re-insert blindly.">
            If the tube comes out, call for help and give oxygen to face and stoma.
          </Notice>
        </div>
      )}
      {compareHref && (
        <div className="mt-4">
          <LinkButton href={compareHref}>Compare with other tubes</LinkButton>
        </div>
      )}
      <p className="mt-4 text-sm text-ink2">{tubeCautions.join(' ')}</p>
    </Card>
  )
}

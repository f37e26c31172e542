import type { ReactNode } from 'react'
import type { ScanView } from '#app/scanning/scan-view.ts'
import { LinkButton } from './button.tsx'
import { DataList } from './data-list.tsx'
import { Warnings } from './warnings.tsx'

interface ScanResultProps {
  readonly view: ScanView
  /** Radio buttons and a button that send the choice, or buttons that choose at once. */
  readonly readBack?: ReactNode
  /** What can be done with the item. */
  readonly children?: ReactNode
}

/** What a scan says: what is wrong first, then the item, then what to do with it. */
export function ScanResult({ view, readBack, children }: ScanResultProps) {
  const { findings, name, facts, next, unknown } = view
  return (
    <section aria-label="Scanned" aria-live="polite" className="grid gap-3 empty:hidden">
      <Warnings warnings={findings} />
      {next && <p className="rounded-control border border-line bg-sunk px-3 py-2 font-semibold">{next}</p>}
      {unknown && <Unknown {...unknown} />}
      {view.readBack.length > 0 && readBack}
      {name && <h2 className="text-lg break-words">{name}</h2>}
      {facts.length > 0 && <DataList items={facts.map(({ term, value }) => ({ label: term, value }))} />}
      {children}
    </section>
  )
}

function Unknown({ gtin, mayDescribe }: NonNullable<ScanView['unknown']>) {
  return (
    <div className="grid gap-2 rounded-card border border-due bg-due-tint p-3">
      <p>
        <b className="font-semibold">This item is not in the catalogue.</b> Read line and size from its label.{' '}
        {!mayDescribe && 'Ask the tracheostomy specialist to describe it; give them its item number.'}
      </p>
      {mayDescribe && (
        <div className="flex flex-wrap gap-2">
          <LinkButton href={`/catalogue/tubes/new?gtin=${gtin}`}>Describe it as a tube</LinkButton>
          <LinkButton href={`/catalogue/inner-cannulas/new?gtin=${gtin}`}>Describe it as an inner cannula</LinkButton>
        </div>
      )}
    </div>
  )
}

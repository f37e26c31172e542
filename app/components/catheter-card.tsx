import type { ComparedTube, TubeCatheters } from '#app/catalogue/compare.ts'
import { Card } from './card.tsx'
import { DataList } from './data-list.tsx'

export interface CatheterCardProps {
  readonly present: { readonly tube: ComparedTube; readonly catheters: TubeCatheters | null }
  readonly rule: { readonly ratio: number; readonly strict: boolean; readonly stockedFr: readonly number[] } | null
}

/** The largest suction catheter of the present tube, with the arithmetic that leads to it and the rule of thumb as a check. */
export function CatheterCard({ present: { tube, catheters }, rule }: CatheterCardProps) {
  if (!rule || !catheters) {
    return <Card title="Largest suction catheter">No reviewed policy is in force: nothing is computed.</Card>
  }
  const idMm = tube.idWithInner ?? tube.idWithoutInner
  const share = `${Math.round(rule.ratio * 100)}%`
  const limit = (idMm * 3 * rule.ratio).toFixed(1)
  const quick = `${catheters.quickRuleFr.toFixed(1)} Fr`
  return (
    <Card title="Largest suction catheter">
      <DataList
        items={[
          {
            label: 'Largest in stock',
            value: catheters.largestFr === undefined ? 'None fits' : `${catheters.largestFr} Fr`,
          },
          {
            label: 'Limit',
            value: `${rule.strict ? 'Below' : 'At most'} ${share} of ${idMm.toFixed(1)} mm: ${limit} Fr`,
          },
          {
            label: 'Check: 2 x (ID - 2)',
            value: catheters.isQuickRuleTooLarge ? `${quick}, more than the limit: the limit counts` : quick,
          },
          { label: 'Sizes in stock', value: `${rule.stockedFr.join(', ')} Fr` },
        ]}
      />
      <p className="mt-3 text-sm text-ink2">
        Counted from the inside diameter with the inner cannula in. Sizes in stock and share are set in the policy. 1 Fr
        is a third of a millimetre of outside diameter.
      </p>
    </Card>
  )
}

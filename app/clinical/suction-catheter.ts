/** How wide a suction catheter may be for a tube, and which sizes there are to choose from. */
export interface CatheterRule {
  readonly stockedFr: readonly number[]
  /** Largest share of the tube's inside diameter that the catheter may take, such as 0.5. */
  readonly ratio: number
  /** Whether the catheter must stay below that share; otherwise it may reach it. */
  readonly strict: boolean
}

// 1.5 times 4.4 is 6.6000000000000005: far below any catheter's tolerance, and enough to refuse an exact fit.
const SLACK = 1e-9

/** The catheter's outside diameter as a share of the tube's inside diameter (`idMm`, with the inner cannula in). */
export function catheterRatio(fr: number, idMm: number): number {
  return fr / 3 / idMm
}

/** Whether a catheter is wider than the rule allows in a tube of that inside diameter (Vanner & Bick 2008; AARC 2010 "less than 50 %"). */
export function isTooLarge(fr: number, idMm: number, rule: Pick<CatheterRule, 'ratio' | 'strict'>): boolean {
  const ratio = catheterRatio(fr, idMm)
  return rule.strict ? ratio > rule.ratio - SLACK : ratio > rule.ratio + SLACK
}

/** The largest stocked size (Fr) for a tube by its inside diameter with the inner cannula in; undefined when none is small enough. */
export function largestCatheter(idMm: number, rule: CatheterRule): number | undefined {
  const fitting = rule.stockedFr.filter(fr => !isTooLarge(fr, idMm, rule))
  return fitting.length > 0 ? Math.max(...fitting) : undefined
}

/**
 * The widely taught rule of thumb, twice (ID - 2), in Fr. From memory, no source found. Shown beside the largest size as a check only:
 * from 9 mm upwards it exceeds half of the inside diameter.
 */
export function quickRuleFr(idMm: number): number {
  return 2 * (idMm - 2)
}

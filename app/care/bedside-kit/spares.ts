import type { CareContext } from '../kind.ts'
import { suturesIn } from '../tube-change/tasks.ts'
import { sizeWords, tubeInPlace } from '../tube-change/tube.ts'

/** What must lie at the bedside for the tube in place, in words; undefined without a tube. */
export function spareWords(context: CareContext): string | undefined {
  const tube = tubeInPlace(context.record)?.data
  if (!tube) return undefined
  const words = [
    `tube ${tube.line} ${sizeWords(tube)} and one size smaller`,
    ...(tube.cuff === 'none' ? ['cuffed tube of the same size'] : []),
    ...(tube.construction === 'dual' ? [`plain inner cannula ${tube.line} ${tube.size}`] : []),
    ...(suturesIn(context) ? ['stitch cutter'] : []),
  ].join('; ')
  return words.charAt(0).toUpperCase() + words.slice(1)
}

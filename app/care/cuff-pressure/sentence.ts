import { sentence } from '../sentence.ts'
import type { CuffData } from './schema.ts'

const by: Readonly<Record<CuffData['method'], string>> = {
  manometer: 'by manometer',
  controller: 'by continuous controller',
  'occlusive volume': 'by minimal occlusive volume',
  'minimal leak': 'by minimal leak',
  'not measured': 'not measured',
}

const where: Readonly<Record<NonNullable<CuffData['position']>, string>> = {
  'head up': 'head up',
  flat: 'lying flat',
  side: 'on the side',
  prone: 'prone',
  sitting: 'sitting out',
}

const why: Readonly<Record<NonNullable<CuffData['reason']>, string>> = {
  scheduled: 'Scheduled.',
  turned: 'After turning.',
  transfer: 'After transfer.',
  inflation: 'After inflation.',
  leak: 'Leak heard.',
  other: 'Other reason.',
}

/** The sentence of a cuff check: found, left at, how. Values stay in the unit of the gauge. */
export function cuffSentence(data: CuffData): string {
  return [
    `${reading(data)}${data.position ? `, ${where[data.position]}` : ''}.`,
    ...(data.cuffNow ? [data.cuffNow === 'deflated' ? 'Cuff let down.' : 'Cuff inflated.'] : []),
    ...(data.reason ? [why[data.reason]] : []),
    ...air(data),
    ...(data.leak === 'yes' ? ['Leak or voice with the cuff up.'] : []),
    ...(data.note ? [sentence(data.note)] : []),
  ].join(' ')
}

function reading(data: CuffData): string {
  if (data.found === undefined) return `Cuff pressure not measured: ${data.whyNot ?? 'no reason given'}`
  const { found, leftAt, unit } = data
  if (leftAt === undefined || leftAt === found) return `Cuff pressure ${found} ${unit} ${by[data.method]}, not adjusted`
  const way = leftAt < found ? 'lowered' : 'raised'
  return `Cuff pressure ${found}, ${way} to ${leftAt} ${unit}, ${by[data.method]}`
}

function air(data: CuffData): readonly string[] {
  if (data.airMl === undefined || data.airMl === 0) return []
  return [data.airMl > 0 ? `${data.airMl} mL of air added.` : `${-data.airMl} mL of air removed.`]
}

import { showDay } from '../../time/display.ts'
import { sentence } from '../sentence.ts'
import type { TubeData } from './schema.ts'

const why: Readonly<Record<TubeData['reason'], string>> = {
  'first insertion': 'First tube put in',
  'on arrival': 'Tube in place on arrival',
  'first change': 'First change',
  routine: 'Changed by date',
  smaller: 'Changed to a smaller tube',
  larger: 'Changed to a larger tube',
  'cuff change': 'Changed for another cuff',
  fault: 'Changed for a fault',
  blocked: 'Changed because it was blocked',
  displaced: 'Changed because it was displaced',
  other: 'Changed',
}

const cuffs: Readonly<Record<TubeData['cuff'], string>> = {
  none: 'no cuff',
  air: 'air cuff',
  water: 'water cuff',
  foam: 'foam cuff',
}

const went: Readonly<Record<TubeData['difficulty'], string>> = {
  easy: 'Went easily',
  some: 'Some difficulty',
  difficult: 'Difficult',
  failed: 'Failed: this tube did not go in',
  'not known': 'How it went is not known',
}

const confirmed: Readonly<Record<TubeData['position'], string>> = {
  capnography: 'position confirmed by capnography',
  airflow: 'position confirmed by airflow',
  scope: 'position confirmed by scope',
  'x-ray': 'position confirmed by X-ray',
  'not confirmed': 'position not confirmed',
}

/** The sentence of a tube change: which tube, then how it went. */
export function tubeSentence(data: TubeData): string {
  const made = data.technique && data.technique !== 'not known' ? `, ${data.technique}` : ''
  const day = data.insertedOn ? ` since ${showDay(data.insertedOn)}` : ''
  return [
    `${why[data.reason]}${day}${made}: ${tubeParts(data).join(', ')}.`,
    `${went[data.difficulty]}, ${confirmed[data.position]}.`,
    `Operator ${data.operator}${helperWords(data)}.`,
    ...findings(data),
  ].join(' ')
}

/** A change is done by two people: that nobody was named is said. Of a tube that came with the patient it may not be known. */
function helperWords({ helper, reason }: TubeData): string {
  if (helper) return `, helper ${helper}`
  return reason === 'on arrival' ? '' : ', no helper named'
}

function tubeParts(data: TubeData): readonly string[] {
  const inner =
    data.construction === 'single'
      ? 'single cannula'
      : `dual cannula (${data.innerCannula === 'none' ? 'no inner cannula in place' : `${data.innerCannula} inner cannula`})`
  const diameters =
    data.idWithInner === undefined ? `ID ${data.idWithoutInner}` : `ID ${data.idWithInner} in ${data.idWithoutInner}`
  return [
    `${data.line} ${data.size} ${data.sizeSystem}`,
    cuffs[data.cuff],
    inner,
    `${diameters}, OD ${data.od}, length ${data.lengthMm} mm`,
    ...(data.connector === 'inner' ? ['15 mm connector on the inner cannula'] : []),
    ...(data.connector === 'none' ? ['no 15 mm connector'] : []),
    ...(data.fenestrated === 'yes' ? ['fenestrated'] : []),
    ...(data.flangeMarkCm === undefined ? [] : [`mark ${data.flangeMarkCm} cm at the flange`]),
    ...(data.lot ? [`lot ${data.lot}`] : []),
    ...(data.expiresOn ? [`expires ${showDay(data.expiresOn)}`] : []),
  ]
}

function findings(data: TubeData): readonly string[] {
  return [
    ...(data.sutures === 'in place' ? ['Flange sutures in place.'] : []),
    ...(data.bleeding && data.bleeding !== 'none' ? [`Bleeding: ${data.bleeding}.`] : []),
    ...(data.spo2Low === undefined ? [] : [`Lowest SpO2 ${data.spo2Low}%.`]),
    ...(data.note ? [sentence(data.note)] : []),
  ]
}

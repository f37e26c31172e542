import type { ItemKind } from '#app/care/field-meta.ts'
import { OTHER_TUBE_ACTION } from '#app/care/inner-cannula/fit.ts'
import { type Recall, recallWords } from '#app/care/recall.ts'
import type { Warning } from '#app/care/warning.ts'
import { showDay } from '#app/time/display.ts'
import type { LocalDay, Zone } from '#app/time/zone.ts'

/** Something that is wrong with an item in the hand. All of it stops: the item is not filled into a form by itself. */
export type Finding = Pick<Warning, 'name' | 'level' | 'action' | 'cause'>

/** What is known of an item when it is judged. */
export interface InHand {
  readonly of: ItemKind
  /** What it is called: `Corvane Dual 8.0`. */
  readonly name: string
  readonly expiresOn: LocalDay | null
  readonly retiredAt: Date | null
  readonly recall: Recall | undefined
  /** It was used already, in an act that is corrected: nobody can take another one. */
  readonly isUsed: boolean
  /** For whom it was scanned; null where nobody is in view. */
  readonly wanted: { readonly of: ItemKind; readonly tube: string | null; readonly fits: boolean } | null
}

/** What is wrong with an item, the worst first. `today` is the ward's day or, of an item that was used, the day of that. */
export function scanFindings(item: InHand, { today, zone }: { today: LocalDay; zone: Zone }): readonly Finding[] {
  return [...wrongThing(item), ...otherTube(item), ...recalled(item, zone), ...expired(item, today), ...retired(item)]
}

const IF_IN_PLACE = 'If it is still in place, ask the tracheostomy team now whether it has to be changed.'

function wrongThing({ of, name, wanted }: InHand): readonly Finding[] {
  if (!wanted || wanted.of === of) return []
  const [is, needed] = of === 'tube' ? ['a tube', 'inner cannula'] : ['an inner cannula', 'tube']
  return [{ name: 'other-kind', level: 'amber', action: `Scan the ${needed}.`, cause: `This is ${is}: ${name}.` }]
}

function otherTube({ of, name, wanted, isUsed }: InHand): readonly Finding[] {
  if (!wanted || wanted.of !== of || wanted.fits) return []
  return [
    {
      name: 'other-tube',
      level: 'red',
      action: OTHER_TUBE_ACTION,
      cause: `Scanned: ${name}. The tube in place ${isUsed ? 'was' : 'is'} ${wanted.tube ?? 'not known'}.`,
    },
  ]
}

function recalled({ recall, isUsed }: InHand, zone: Zone): readonly Finding[] {
  if (!recall) return []
  return [
    {
      name: 'recalled',
      level: 'amber',
      action: isUsed ? IF_IN_PLACE : 'Do not use this one. Take another, and keep this one apart.',
      cause: recallWords(recall, zone),
    },
  ]
}

function expired({ expiresOn, isUsed }: InHand, today: LocalDay): readonly Finding[] {
  if (expiresOn === null || expiresOn >= today) return []
  return [
    {
      name: 'expired',
      level: 'amber',
      action: isUsed ? IF_IN_PLACE : 'Do not use this one. Take another.',
      cause: `It ${isUsed ? 'had expired' : 'expired'} on ${showDay(expiresOn)}.`,
    },
  ]
}

function retired({ retiredAt, isUsed }: InHand): readonly Finding[] {
  if (!retiredAt || isUsed) return []
  return [
    {
      name: 'retired',
      level: 'blue',
      action: 'Ask the tracheostomy team which one takes its place.',
      cause: 'It is not bought any more.',
    },
  ]
}

/** Whether an item with these findings is filled into a form only when somebody says that it is in place already. */
export function stops(findings: readonly Finding[]): boolean {
  return findings.some(({ level }) => level !== 'blue')
}

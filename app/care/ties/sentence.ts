import { sentence } from '../sentence.ts'
import { holders, skinUnderTies, type TieData } from './schema.ts'

const fit: Readonly<Record<TieData['fingers'], string>> = {
  none: 'no finger fits under them',
  one: 'one finger fits',
  two: 'two fingers fit',
  'more than two': 'more than two fingers fit',
}

/** The sentence of a look at the ties: what was done, how they fit, what they are, the skin, who helped. */
export function tieSentence(data: TieData): string {
  return [
    `Ties ${data.changed === 'yes' ? 'changed' : 'looked at'}: ${fit[data.fingers]}.`,
    ...(data.holder === 'other' ? [] : [`Holder ${lower(holders[data.holder])}.`]),
    `Skin under them ${lower(skinUnderTies[data.skin])}.`,
    ...(data.secondPerson
      ? [sentence(data.secondPerson === 'alone' ? 'Done alone' : `With ${data.secondPerson}`)]
      : []),
    ...(data.note ? [sentence(data.note)] : []),
  ].join(' ')
}

const lower = (words: string): string => words.charAt(0).toLowerCase() + words.slice(1)

import { refusedWords } from './refused-words.ts'

/** OWASP ASVS 5.0, 6.2.1 and 6.2.9, with the longer minimum that goes with a password alone. */
export const SHORTEST_PASSWORD = 12
export const LONGEST_PASSWORD = 128

/** What an attacker would try first for this person. */
export type PasswordOwner = { readonly name: string; readonly email: string; readonly wardNames: readonly string[] }

const FEWEST_OTHER_CHARACTERS = 6

/** What is wrong with a password, as a sentence for its owner, or `null`. There are no rules about kinds of characters. */
export function passwordFault(password: string, owner: PasswordOwner): string | null {
  const text = password.normalize('NFKC')
  const { length } = [...text]
  if (length < SHORTEST_PASSWORD) return `Use at least ${SHORTEST_PASSWORD} characters. Several words are fine.`
  if (length > LONGEST_PASSWORD) return `Use at most ${LONGEST_PASSWORD} characters.`
  if (new Set(text).size < FEWEST_OTHER_CHARACTERS) return 'Use more different characters: this is easy to guess.'
  return isBuiltFrom(wordsOf(owner), text)
    ? 'This is little more than a name, a ward, a date or a common word, and easy to guess. Use several unrelated words.'
    : null
}

/** Letters and digits only, small: `Ward 7 (ICU)` is `ward7icu`. */
const bare = (text: string): string => text.toLowerCase().replace(/[^\p{L}\p{N}]/gu, '')

function wordsOf({ name, email, wardNames }: PasswordOwner): readonly string[] {
  const own = [name, email, ...wardNames].flatMap(text => [bare(text), ...text.split(/[^\p{L}\p{N}]+/u).map(bare)])
  return [...own.filter(word => word.length > 2), ...refusedWords].sort((a, b) => b.length - a.length)
}

function isBuiltFrom(words: readonly string[], text: string): boolean {
  let rest = bare(text)
  for (const word of words) rest = rest.replaceAll(word, ' ')
  const other = withoutRuns(rest.replace(/(19|20)\d\d/g, ' ')).replaceAll(' ', '')
  return [...other].length < FEWEST_OTHER_CHARACTERS
}

/** Runs such as `1234`, `dcba` and `aaaa` count as the one character they begin with. */
function withoutRuns(text: string): string {
  const codes = [...text].map(character => character.codePointAt(0) ?? 0)
  return [...text].filter((_, at) => at === 0 || !isNextTo(codes[at - 1], codes[at])).join('')
}

const isNextTo = (before: number | undefined, code: number | undefined): boolean =>
  before !== undefined && code !== undefined && Math.abs(before - code) <= 1

import type { AnyCareKind } from '../care/kind.ts'
import { type CompetenceStanding, type Skill, skills, standingWords } from '../care/skills.ts'

/** How an entry was signed, as it is stored beside it. */
export interface SignatureFact {
  readonly part: 'author' | 'second person'
  readonly role: string
  readonly proof: 'password' | 'recent sign-in' | 'session' | 'not given'
  readonly competence: CompetenceStanding | null
}

const proofs = {
  password: 'signed with the password',
  'recent sign-in': 'signed by a fresh sign-in',
  session: null,
  'not given': 'charted without the password that was asked for',
} as const

/** How the author signed: null where nothing beyond their session was asked for. */
export function authorWords(signatures: readonly SignatureFact[]): string | null {
  const own = signatures.find(({ part }) => part === 'author')
  return own ? proofs[own.proof] : null
}

/** `R. Osei, respiratory therapist, signed on the same screen`; null where nobody was named. */
export function secondPersonWords(
  entry: { readonly witnessName: string | null; readonly recordedByName: string },
  signatures: readonly SignatureFact[],
): string | null {
  if (entry.witnessName === null) return null
  const second = signatures.find(({ part }) => part === 'second person')
  if (second) return `${entry.witnessName}, ${second.role}, signed on the same screen`
  return `${entry.witnessName}, named by ${entry.recordedByName}, not signed`
}

/** `Tube change, performing: sign-off out of date`, as it was when the act was charted; null where the act asks for none. */
export function competenceWords(kind: AnyCareKind | undefined, signatures: readonly SignatureFact[]): string | null {
  const stood = signatures.find(({ part }) => part === 'author')?.competence
  const skill: Skill | undefined = kind?.needsCompetence
  if (!stood) return null
  return `${skill ? `${skills[skill]}: ` : ''}${standingWords[stood]}`
}

import type { Skill } from './skills.ts'

/** What an act asks of those who sign it. None of it keeps an act that was done out of the record. */
export interface SigningNeeds<Data> {
  /** A final act, such as taking a tube out: the form asks for the signer's own password again. */
  readonly needsFreshSignIn?: boolean
  /** The skill that whoever does this is signed off for. Its lack warns, and is kept with the entry. */
  readonly needsCompetence?: Skill
  /** Whether this is an act of two people: the form then asks for the second one, who signs on the same screen. */
  twoPeople?(data: Data): boolean
}

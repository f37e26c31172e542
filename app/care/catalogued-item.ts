/** An item of the catalogue as an act refers to it. `fits`: the tubes that an inner cannula is made for, by their ids. */
export interface CataloguedItem {
  readonly id: string
  readonly line: string
  /** Names that the line had before: what was charted under them stays as it was. */
  readonly formerLines: readonly string[]
  readonly size: string
  readonly fits: readonly string[]
}

import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import { create, type Font } from 'fontkit'

/** The typeface comes in parts, one for each script; a text is set from as many of them as it needs. */
const parts = ['latin', 'latin-ext', 'greek', 'cyrillic', 'vietnamese', 'greek-ext', 'cyrillic-ext'] as const
type Part = (typeof parts)[number]

export const weights = [400, 700] as const
export type Weight = (typeof weights)[number]

/** A stretch of text that one part of the typeface can set. `font` is the name that `fontFiles` gives it. */
export interface Run {
  readonly font: string
  readonly text: string
}

const required = createRequire(import.meta.url)
const fileOf = (part: Part, weight: Weight) =>
  required.resolve(`@fontsource/source-sans-3/files/source-sans-3-${part}-${weight}-normal.woff`)
const nameOf = (part: Part, weight: Weight) => `${part}-${weight}`

/** Every part of the typeface: the name that runs give it, and its file. */
export const fontFiles: readonly { readonly name: string; readonly file: string }[] = weights.flatMap(weight =>
  parts.map(part => ({ name: nameOf(part, weight), file: fileOf(part, weight) })),
)

const opened = new Map<Part, Font>()

function covers(part: Part, character: string): boolean {
  const known = opened.get(part)
  const font = known ?? (create(readFileSync(fileOf(part, 400))) as Font)
  if (!known) opened.set(part, font)
  return font.hasGlyphForCodePoint(character.codePointAt(0) ?? 0)
}

/**
 * A text as runs. What no part of the typeface has is written as its number, `[U+4E2D]`: a name must never lose a letter
 * without anybody seeing it.
 */
export function runsOf(text: string, weight: Weight): readonly Run[] {
  const runs: { part: Part; text: string }[] = []
  for (const character of printable(text)) {
    const last = runs.at(-1)
    if (last && covers(last.part, character)) last.text += character
    else runs.push({ part: parts.find(part => covers(part, character)) ?? 'latin', text: character })
  }
  return runs.map(run => ({ font: nameOf(run.part, weight), text: run.text }))
}

/** The text with each character that cannot be set as its number. Letters and their marks are put together first. */
export function printable(text: string): string {
  return [...text.normalize('NFC')].map(shown).join('')
}

function shown(character: string): string {
  if (parts.some(part => covers(part, character))) return character
  const number = (character.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, '0')
  return `[U+${number}]`
}

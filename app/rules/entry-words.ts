import { lateEntryAfter } from '../care/general-settings.ts'
import { type StoredEntry, wordsOf } from '../care/kind.ts'
import { findKind } from '../care/kinds.ts'
import { photographsIn } from '../care/photographs.ts'
import type { Values } from '../care/policy.ts'
import { readEntry } from '../care/record.ts'
import { showDuration } from '../time/display.ts'
import { minutes, since } from '../time/duration.ts'

/** An entry in words: its title and sentence, or that it cannot be read, with its raw text. */
export interface EntryWords {
  readonly title: string
  readonly sentence: string
  readonly readable: boolean
}

/** The words of a stored entry. One that today's program cannot read is shown as it is stored, never hidden. */
export function entryWords(stored: StoredEntry): EntryWords {
  const kind = findKind(stored.kind)
  const entry = kind && readEntry(kind, stored)[0]
  if (kind && entry) return { title: kind.title, sentence: kind.summary(entry.data), readable: true }
  const raw = typeof stored.raw === 'string' ? stored.raw : JSON.stringify(stored.raw)
  return {
    title: kind?.title ?? wordsOf(stored.kind),
    sentence: `This entry cannot be read by the program. As stored: ${raw}`,
    readable: false,
  }
}

/** `charted 2 h 10 min later` for an entry written down late, by the policy; undefined when it was not. */
export function lateWords(entry: Pick<StoredEntry, 'performedAt' | 'recordedAt'>, values: Values): string | undefined {
  const delay = since(entry.performedAt, entry.recordedAt)
  return delay > minutes(values.of(lateEntryAfter)) ? `late entry, charted ${showDuration(delay)} later` : undefined
}

/** The ids of an entry's photographs; none of one that cannot be read. */
export function photographsOf(stored: StoredEntry): readonly string[] {
  const kind = findKind(stored.kind)
  const entry = kind && readEntry(kind, stored)[0]
  return kind && entry ? photographsIn(kind, entry.data) : []
}

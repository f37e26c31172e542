import type { ReactNode } from 'react'

export type TagTone = 'late' | 'due' | 'soon' | 'ok' | 'plain'

export interface TagProps {
  readonly tone?: TagTone
  readonly children: ReactNode
}

const tones: Readonly<Record<TagTone, string>> = {
  late: 'border-late bg-late-tint text-late',
  due: 'border-due bg-due-tint text-due',
  soon: 'border-soon bg-surface text-soon',
  ok: 'border-transparent bg-brand-tint text-brand',
  plain: 'border-line bg-surface text-ink2',
}

/** A few words on how something stands. */
export function Tag({ tone = 'plain', children }: TagProps) {
  return (
    <span className={`inline-block rounded-tag border px-2 py-px text-sm font-semibold ${tones[tone]}`}>
      {children}
    </span>
  )
}

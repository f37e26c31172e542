import type { ReactNode } from 'react'
import { Wordmark } from './mark.tsx'
import { SafetyLine } from './safety-line.tsx'

export interface PlainPageProps {
  readonly children: ReactNode
  readonly wide?: boolean
}

/** A page outside the application's bars: signing in, first setting up, an error. */
export function PlainPage({ children, wide = false }: PlainPageProps) {
  return (
    <div className="flex min-h-dvh flex-col px-4 py-6">
      <div className={`mx-auto flex w-full flex-1 flex-col ${wide ? 'max-w-3xl' : 'max-w-lg'}`}>
        <header className="mb-6">
          <Wordmark />
        </header>
        <main id="main" tabIndex={-1} className="rounded-card border border-line bg-surface p-5 outline-none sm:p-8">
          {children}
        </main>
      </div>
      <SafetyLine />
    </div>
  )
}

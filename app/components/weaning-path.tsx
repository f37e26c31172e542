import type { ReactNode } from 'react'
import { Link } from 'react-router'
import type { PathStep, StepState } from '#app/rules/weaning-steps.ts'

/** Told apart by shape: a tick in a full disc, a ring with its middle, an empty ring, a broken one. */
const looks: Readonly<Record<StepState, { readonly says: string; readonly draws: ReactNode }>> = {
  done: {
    says: 'Done',
    draws: (
      <>
        <circle cx="12" cy="12" r="11" className="fill-brand stroke-brand" />
        <path d="M6.5 12.5l4 4 7-8" className="stroke-brand-ink stroke-[2.5]" />
      </>
    ),
  },
  here: {
    says: 'Here now',
    draws: (
      <>
        <circle cx="12" cy="12" r="10.5" className="fill-surface stroke-due stroke-3" />
        <circle cx="12" cy="12" r="5" className="fill-due stroke-due" />
      </>
    ),
  },
  ahead: {
    says: 'Ahead',
    draws: <circle cx="12" cy="12" r="10.5" className="fill-surface stroke-edge stroke-2" />,
  },
  open: {
    says: 'Not passed',
    draws: (
      <>
        <circle cx="12" cy="12" r="10.5" className="fill-surface stroke-ink2 stroke-2" />
        <path d="M8 8l8 8M16 8l-8 8" className="stroke-ink2 stroke-2" />
      </>
    ),
  },
  'not needed': {
    says: 'Does not arise',
    draws: (
      <>
        <circle cx="12" cy="12" r="10.5" className="fill-surface stroke-edge stroke-2 [stroke-dasharray:3_3]" />
        <path d="M7 12h10" className="stroke-edge stroke-2" />
      </>
    ),
  },
}

/** The steps out of the tube: beside each other on a desk, beneath each other on a phone. */
export function WeaningSteps({ steps }: { readonly steps: readonly PathStep[] }) {
  return (
    <ol className="grid gap-x-4 gap-y-3 md:grid-flow-col md:auto-cols-fr">
      {steps.map(({ name, title, state, says, entryId }) => {
        const look = looks[state]
        return (
          <li
            key={name}
            aria-current={state === 'here' ? 'step' : undefined}
            className="flex gap-3 border-line max-md:border-b max-md:pb-3 max-md:last:border-0 max-md:last:pb-0 md:flex-col md:gap-1.5 md:border-t-3 md:pt-3 aria-[current]:md:border-due"
          >
            <svg
              role="img"
              aria-label={look.says}
              viewBox="0 0 24 24"
              fill="none"
              strokeLinecap="round"
              strokeLinejoin="round"
              className="size-7 flex-none"
            >
              {look.draws}
            </svg>
            <div className="min-w-0">
              <h3 className="text-base leading-tight font-semibold">{title}</h3>
              <p className="text-sm text-ink2">
                <b className={`font-semibold ${state === 'here' ? 'text-due' : ''}`}>{look.says}.</b>{' '}
                {says && `${says}.`}
              </p>
              {entryId && (
                <Link
                  to={`/entries/${entryId}`}
                  aria-label={`Open the entry of ${title}`}
                  className="inline-flex min-h-11 items-center text-sm font-semibold underline underline-offset-3"
                >
                  Open the entry
                </Link>
              )}
            </div>
          </li>
        )
      })}
    </ol>
  )
}

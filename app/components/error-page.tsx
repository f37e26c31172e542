import { isRouteErrorResponse } from 'react-router'
import { LinkButton } from './button.tsx'
import { PlainPage } from './plain-page.tsx'

interface Words {
  readonly title: string
  readonly says: string
}

const UNREADABLE: Words = {
  title: 'The program failed on this page',
  says: 'If you were charting, look at the patient’s timeline before you chart again: it shows what was kept.',
}

const UNREACHED: Words = {
  title: 'The server cannot be reached. Nothing was charted.',
  says: 'Look at the network of this device and try again in a minute. Until then chart on paper.',
}

const wordsByStatus: Readonly<Record<number, Words>> = {
  400: { title: 'This could not be read', says: 'Nothing was charted. Go back, and try again from the form.' },
  403: { title: 'This is not open to you', says: 'Your role or your ward does not include it. Nothing was changed.' },
  404: { title: 'There is nothing here', says: 'The address may be mistyped, or what it showed may have been closed.' },
  413: { title: 'This is too long', says: 'Nothing was kept. Go back, and send less at once.' },
  503: {
    title: 'The database cannot be reached. Nothing was charted.',
    says: 'Chart on paper until this page opens again, then enter the care with the time it was done.',
  },
  504: {
    title: 'The database went away while this was being saved',
    says: 'Nobody knows yet whether it was. Go back and send the form again: it is charted once.',
  },
}

/** What a thrown `data(words, …)` carries to be read by people; anything else it carries is not shown. */
function ownWords(error: unknown): string | undefined {
  if (!isRouteErrorResponse(error) || typeof error.data !== 'string' || error.data === '') return undefined
  // The router's own words about an address that leads nowhere are for developers.
  return error.data.startsWith('Error: No route matches URL') ? undefined : error.data
}

/** A page that was asked for from another page fails as `fetch` does when no answer comes. Each browser has words of its own. */
const isUnreached = (error: unknown): boolean =>
  error instanceof TypeError && /failed to fetch|networkerror|load failed/i.test(error.message)

function wordsFor(error: unknown): Words {
  const status = isRouteErrorResponse(error) ? error.status : 500
  const words = wordsByStatus[status]
  if (!words) return isUnreached(error) ? UNREACHED : UNREADABLE
  const says = ownWords(error) ?? words.says
  // A 503 with words of its own is not about the database.
  return { title: status === 503 && says !== words.says ? 'Not at this moment' : words.title, says }
}

export interface ErrorPageProps {
  readonly error: unknown
  readonly reference: string | null
}

/** The last page there is: says what happened and what was kept, with a reference instead of a stack. */
export function ErrorPage({ error, reference }: ErrorPageProps) {
  const { title, says } = wordsFor(error)
  return (
    <PlainPage>
      <h1 className="text-2xl">{title}</h1>
      <p className="mt-3 text-lg">{says}</p>
      {reference !== null && (
        <p className="mt-3 text-ink2">
          Reference for the people who run the program: <b className="select-all font-semibold text-ink">{reference}</b>
        </p>
      )}
      <div className="mt-6 flex flex-wrap gap-3">
        <LinkButton href="/" variant="primary">
          Go to the start
        </LinkButton>
      </div>
    </PlainPage>
  )
}

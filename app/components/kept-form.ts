import { data, isRouteErrorResponse } from 'react-router'
import type { ChartAnswer } from '#app/charting/chart-answer.ts'

const AWAY =
  'Nothing was charted: the database cannot be reached. What you typed is still here. Send it again in a minute; until then chart on paper.'
const UNSURE =
  'No answer came, so it is not known yet whether this was charted. What you typed is still here. Send it again: it is charted once. Until then keep it on paper.'

/**
 * The server's answer to a form or, where none came, one that leaves the page and everything typed as it is. Redirects
 * and mistakes of the program are passed on.
 */
export async function answerOrKept<Answer>(ask: () => Promise<Answer>) {
  try {
    return await ask()
  } catch (error) {
    // A `fetch` that failed may have reached the server: only the server itself can say that nothing was charted.
    const status = isRouteErrorResponse(error) ? error.status : error instanceof TypeError ? 504 : undefined
    if (status !== 503 && status !== 504) throw error
    const answer: ChartAnswer = { is: 'unavailable', says: status === 504 ? UNSURE : AWAY }
    return data(answer, status)
  }
}

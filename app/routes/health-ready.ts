import { requestContext } from '#app/request-context.server.ts'
import { shutdownSignal } from '#app/shutdown.server.ts'
import { readiness } from '#database/readiness.server.ts'
import type { Route } from './+types/health-ready'

/** Whether requests may be sent here. The reason is told to this machine only. */
export async function loader({ context }: Route.LoaderArgs) {
  const state = shutdownSignal.aborted ? 'stopping' : await readiness()
  const { address } = context.get(requestContext)
  const isLocal = address === '::1' || address.replace('::ffff:', '').startsWith('127.')
  const status = state === 'ready' ? 200 : 503
  return Response.json(isLocal ? { status: state } : { status: status === 200 ? 'ready' : 'not ready' }, { status })
}

import { createRequestHandler, RouterContextProvider, type ServerBuild } from 'react-router'
import { handleError } from '#app/entry.server.tsx'
import { requestContext } from '#app/request-context.server.ts'
import * as root from '#app/root.tsx'
import routeMap from '#app/routes.ts'
import { site } from './people.ts'

/** A route of the application as its address is written: `/patients/:patientId/chart/:kind`. */
export interface MappedRoute {
  readonly file: string
  readonly pattern: string
  /** It answers a write. */
  readonly hasAction: boolean
}

type Configured = (typeof routeMap)[number]
type Manifest = ServerBuild['routes']
type RouteModule = NonNullable<Manifest[string]>['module']

const modules = import.meta.glob<RouteModule>('../app/routes/*.{ts,tsx}')

/**
 * The whole application without its server: every route with its middleware, loaders and actions, from a request to the
 * status and headers of its answer. Pages are not rendered.
 */
export async function application() {
  const manifest: Manifest = { root: { id: 'root', path: '', module: root } as never }
  const mapped: MappedRoute[] = []
  await addRoutes(routeMap, 'root', '', manifest, mapped)
  const handle = createRequestHandler(buildOf(manifest), 'production')
  return {
    routes: mapped,
    answer: (request: Request, address = '203.0.113.7'): Promise<Response> => {
      const context = new RouterContextProvider()
      context.set(requestContext, { address, requestId: 'request-1', nonce: undefined, logged: {} })
      return handle(request, context)
    },
  }
}

async function addRoutes(
  configured: readonly Configured[],
  parentId: string,
  above: string,
  manifest: Manifest,
  mapped: MappedRoute[],
): Promise<void> {
  for (const { file, path, index = false, children = [] } of configured) {
    const load = modules[`../app/${file}`]
    if (!load) throw new Error(`${file} is not there`)
    const module = await load()
    manifest[file] = { id: file, parentId, module, ...(path === undefined ? {} : { path }), index } as never
    const pattern = path === undefined ? above : `${above}/${path}`
    // A layout has no address, and a route with an index is answered by that.
    const isAnswered = index || (path !== undefined && !children.some(child => child.index))
    if (isAnswered) mapped.push({ file, pattern: pattern || '/', hasAction: module.action !== undefined })
    await addRoutes(children, file, pattern, manifest, mapped)
  }
}

function buildOf(routes: Manifest): ServerBuild {
  const client = Object.fromEntries(
    Object.values(routes).flatMap(route =>
      route ? [[route.id, { ...route, module: '', hasErrorBoundary: false }]] : [],
    ),
  )
  return {
    routes,
    entry: {
      module: { default: (_request, status, headers) => new Response('page', { status, headers }), handleError },
    },
    assets: { entry: { imports: [], module: '' }, routes: client as never, url: '', version: 'test' },
    publicPath: '/',
    assetsBuildDirectory: '',
    ssr: true,
    isSpaMode: false,
    prerender: [],
    routeDiscovery: { mode: 'initial', manifestPath: '/__manifest' },
    future: { v8_middleware: true, v8_passThroughRequests: true, v8_trailingSlashAwareDataRequests: true } as never,
  }
}

/** What a browser of this site sends: a page that is asked for, or an empty form. */
export function browserRequest(method: 'GET' | 'POST', path: string, cookie: string | null): Request {
  const headers = { 'Sec-Fetch-Dest': 'document', ...(cookie === null ? {} : { Cookie: cookie }) }
  if (method === 'GET') return new Request(site + path, { headers })
  return new Request(site + path, { method, headers: { ...headers, Origin: site }, body: new URLSearchParams() })
}

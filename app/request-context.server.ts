import { createContext } from 'react-router'

/** What the server knows of a request before any route runs. */
export interface RequestFacts {
  /** The client's network address, also behind a proxy on this machine. */
  readonly address: string
  /** Names this request in the log, and on the page that says something failed. */
  readonly requestId: string
  /** Allows this response's own scripts; undefined in development, where no policy is set. */
  readonly nonce: string | undefined
  /** Written to the request's line in the log when it ends. Ids only, never a name or anything charted. */
  readonly logged: Record<string, string | number>
}

/** Set by server.ts for each request. The default stands in the development server, which sets nothing. */
export const requestContext = createContext<RequestFacts>({
  address: '127.0.0.1',
  requestId: 'development',
  nonce: undefined,
  logged: {},
})

const shutdown = new AbortController()

/** Aborts when the server is told to stop: whoever keeps a response open ends it then. */
export const shutdownSignal = shutdown.signal

/** Tells all that listen to `shutdownSignal` that the server is about to stop. */
export function beginShutdown(): void {
  shutdown.abort()
}

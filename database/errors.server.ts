import { ConnectionError, DatabaseError, UniqueConstraintError } from 'sequelize'

/**
 * The database does not answer. React Router takes its three last fields for those of a thrown `data()`, so that
 * wherever it is thrown it becomes the page of a 503, or of a 504 when the connection was lost during COMMIT, since then
 * nobody knows whether it took effect. The message is for the person at the screen.
 */
export class DatabaseUnavailable extends Error {
  override readonly name = 'DatabaseUnavailable'
  readonly type = 'DataWithResponseInit'
  readonly data = ''
  readonly init: { readonly status: 503 | 504 }

  constructor(
    cause: unknown,
    readonly committing = false,
  ) {
    super(
      committing
        ? 'The database went away while this was being saved. Send the form again: it is charted once.'
        : 'The database cannot be reached. Nothing was charted.',
      { cause },
    )
    this.init = { status: committing ? 504 : 503 }
  }
}

// Codes of the connector and the server that say the connection, not the statement, failed.
const LOST = new Set([
  'ER_SOCKET_UNEXPECTED_CLOSE',
  'ER_SOCKET_TIMEOUT',
  'ER_CONNECTION_TIMEOUT',
  'ER_CMD_CONNECTION_CLOSED',
  'ER_CMD_NOT_EXECUTED_DESTROYED',
  'ER_CONNECTION_ALREADY_CLOSED',
  'ER_CONNECTION_KILLED',
  'ER_SERVER_SHUTDOWN',
  'ER_STATEMENT_TIMEOUT',
  'ECONNRESET',
  'ECONNREFUSED',
  'EPIPE',
])

// Deadlock, lock wait timeout, and a row changed since the snapshot (innodb_snapshot_isolation).
const WORTH_A_RETRY = new Set([1213, 1205, 1020])

/** The error as `DatabaseUnavailable` when the connection was lost or could not be had, else the error itself. */
export function translated(error: unknown): unknown {
  if (error instanceof ConnectionError) return new DatabaseUnavailable(error)
  return LOST.has(String(driverError(error).code)) ? new DatabaseUnavailable(error) : error
}

/** True when the transaction failed only because another one was in its way, so that all of it may be tried again. */
export function isWorthARetry(error: unknown): boolean {
  return WORTH_A_RETRY.has(Number(driverError(error).errno))
}

/** True when a row was refused because the named unique index holds its values already ('PRIMARY' for the key). */
export function isUniqueViolation(error: unknown, indexName: string): boolean {
  if (!(error instanceof UniqueConstraintError)) return false
  const { sqlMessage } = driverError(error)
  return typeof sqlMessage === 'string' && sqlMessage.endsWith(` for key '${indexName}'`)
}

function driverError(error: unknown): object & { code?: unknown; errno?: unknown; sqlMessage?: unknown } {
  const wrapped = error instanceof DatabaseError || error instanceof UniqueConstraintError
  if (wrapped) return error.parent
  return error instanceof Error ? error : {}
}

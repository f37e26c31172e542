import * as mariadb from 'mariadb'
import { type Options, type QueryOptions, Sequelize } from 'sequelize'
import { translated } from './errors.server.ts'

/** A connection pool to one database: UTC, exact decimals, numbers for BIGINT, no parameter values in any message. */
export function connection(url: string, options: { maxConnections?: number; queryTimeoutMs?: number } = {}): Sequelize {
  const { maxConnections = 10, queryTimeoutMs = 10_000 } = options
  const connected: Options = {
    dialect: 'mariadb',
    dialectModule: mariadb,
    timezone: '+00:00',
    logging: false,
    pool: { max: maxConnections, min: 0, acquire: 5000, idle: 10_000 },
    define: { underscored: true, freezeTableName: true },
    dialectOptions: {
      // For every transaction of a connection, in place of one statement more in each.
      initSql: 'SET SESSION TRANSACTION ISOLATION LEVEL READ COMMITTED',
      connectTimeout: 3000,
      queryTimeout: queryTimeoutMs,
      // The server's own limit does not cover a COMMIT, which hangs on a full disk: the socket gives up a little later.
      socketTimeout: queryTimeoutMs + 5000,
      supportBigNumbers: false,
      insertIdAsNumber: true,
      bigIntAsNumber: true,
      checkNumberRange: true,
      decimalAsNumber: false,
      logParam: false,
    },
  }
  const pool = new Sequelize(url, connected)
  // Every statement, a model's too, goes through here: so each tells in the same words that the database is away.
  const query = pool.query.bind(pool)
  pool.query = ((sql: string, values?: QueryOptions) =>
    query(sql, values).catch(error => {
      throw translated(error)
    })) as typeof pool.query
  return pool
}

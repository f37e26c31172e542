import type { QueryInterface } from 'sequelize'
import type { MigrationFn } from 'umzug'

/** One direction of a migration: it is given Sequelize's query interface as `context`. */
export type MigrationStep = MigrationFn<QueryInterface>

/** One numbered step of the schema, and the way back. */
export interface Migration {
  readonly up: MigrationStep
  readonly down: MigrationStep
}

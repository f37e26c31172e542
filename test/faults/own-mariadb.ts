import { chmodSync, mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { DatabaseServer } from '#test/journeys/app.ts'
import { startMariadb, stopMariadb } from '../../database/run/mariadb.mjs'
import { processStamp, until } from '../../database/run/processes.mjs'

export interface OwnMariadb extends DatabaseServer {
  /** Ends the server with SIGKILL, whatever it is doing. */
  kill(): Promise<void>
  /** Stops its process without ending it: it takes connections and never answers, as on a disk that hangs. */
  freeze(): void
  thaw(): void
  /** Starts it again where it was, with what it had. */
  restart(): Promise<void>
  /** Ends it for good and removes its files. */
  remove(): Promise<void>
}

/** A MariaDB of this test alone that waits for the disk at every commit, as in earnest. */
export async function ownMariadb(): Promise<OwnMariadb> {
  const folder = mkdtempSync(join(tmpdir(), 'cannulary-fault-'))
  chmodSync(folder, 0o711) // user mysql has to walk through
  const { url } = await startMariadb({ folder, hold: true })
  const signal = (name: NodeJS.Signals) => {
    const { server } = JSON.parse(readFileSync(join(folder, 'database.json'), 'utf8'))
    const pid = Number(String(server).split(':')[0])
    process.kill(pid, name)
    return pid
  }
  return {
    app: url('app', '').replace(/\/$/, ''),
    owner: url('owner', '').replace(/\/$/, ''),
    async kill() {
      const pid = signal('SIGKILL')
      await until(() => processStamp(pid) === null, 10_000)
    },
    freeze: () => void signal('SIGSTOP'),
    thaw: () => void signal('SIGCONT'),
    async restart() {
      await startMariadb({ folder, hold: true })
    },
    async remove() {
      await stopMariadb(folder)
      rmSync(folder, { recursive: true, force: true })
    },
  }
}

// npm run db -- start | stop | status: the private MariaDB of the data folder, for work without the application.
import { runningMariadb, startMariadb, stopMariadb } from './mariadb.mjs'

const folder = process.env.CANNULARY_DATA || '.data'
const [command] = process.argv.slice(2)

try {
  console.log(await answer())
} catch (error) {
  console.error(error instanceof Error ? error.message : error)
  process.exitCode = 1
}

async function answer() {
  switch (command) {
    case 'start': {
      const { port, note } = await startMariadb({ folder })
      return `MariaDB runs on 127.0.0.1:${port} with its data in ${folder}${note ? `, ${note}` : ''}. Stop: npm run db -- stop`
    }
    case 'stop':
      return (await stopMariadb(folder)) ? 'MariaDB is stopped.' : 'MariaDB was not running.'
    case 'status': {
      const server = runningMariadb(folder)
      process.exitCode = server ? 0 : 3 // as an init script says "not running"
      return server ? `MariaDB runs on 127.0.0.1:${server.port}.` : 'MariaDB is not running.'
    }
    default:
      throw new Error('Say what to do: npm run db -- start | stop | status')
  }
}

import '../environment.ts'
import { sequelize } from '../sequelize.server.ts'
import { verifyAccessLog } from '../verify-access-log.server.ts'
import { verifyEntries } from '../verify-entries.server.ts'
import { verifySignatures } from '../verify-signatures.server.ts'

// Reads every entry and every line of the access log, and ends with 1 when anything is not as it was written.
const MOST_SHOWN = 50

try {
  const entries = await verifyEntries()
  console.log(
    `entries: ${entries.entries} in ${entries.stays} stays, ${entries.faults.length} faults, digest ${entries.digest}`,
  )
  for (const { stayId, number, says } of entries.faults.slice(0, MOST_SHOWN)) {
    console.log(`  stay ${stayId}, entry ${number}: ${says}`)
  }
  const { signatures, faults } = await verifySignatures()
  console.log(`signatures: ${signatures}, ${faults.length} faults`)
  for (const { entryId, part } of faults.slice(0, MOST_SHOWN)) {
    console.log(`  entry ${entryId}, ${part}: is not as it was written`)
  }
  const log = await verifyAccessLog()
  console.log(`access log: ${log.links} lines in ${log.chains} chains, digest ${log.digest}`)
  if (log.firstBad) console.log(`  ${log.firstBad.chain}, line ${log.firstBad.seq}: ${log.firstBad.says}`)
  if (entries.faults.length > 0 || faults.length > 0 || log.firstBad) process.exitCode = 1
} catch (error) {
  console.error(error instanceof Error ? error.message : error)
  process.exitCode = 2
} finally {
  await sequelize.close()
}

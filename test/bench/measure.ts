// The measuring half of npm run bench, on the MariaDB that bench.mjs has started.
import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { parseArgs } from 'node:util'
import { compared, firstTime } from './compare.ts'
import { filledDatabase } from './databases.ts'
import { boardPage, comparisons, type Setting } from './figures.ts'
import { largeHospital, smallHospital } from './hospital.ts'
import { profiled } from './profile.ts'
import { table } from './report.ts'
import { served } from './servers.ts'

const { values: options } = parseArgs({ options: { json: { type: 'boolean' }, profile: { type: 'boolean' } } })
const { BENCH_FOLDER: folder = '' } = process.env
const database = Number(readFileSync(join(folder, 'mariadb', 'server.pid'), 'utf8'))
const startedAt = performance.now()

tell('inventing a hospital')
const hospital = largeHospital(new Date())
tell('loading it')
const large = await filledDatabase('cannulary_large', hospital)
const small = await filledDatabase('cannulary_small', smallHospital(hospital))
tell(`measuring on ${large.entries} and ${small.entries} entries`)

const secret = {
  SESSION_SECRET: 'a secret for the bench, of 40 characters',
  HOSPITAL_TIME_ZONE: hospital.hospital.zone,
}
const applicationEnv = { ...secret, DATABASE_URL: large.appUrl }
const setting: Setting = {
  large,
  small,
  application: await served('server.ts', applicationEnv),
  applicationOnSmall: await served('server.ts', { ...secret, DATABASE_URL: small.appUrl }),
  bare: await served('test/bench/floor/server.ts', { DATABASE_URL: large.appUrl }),
}
const opening = await firstTime(boardPage(setting.application, large))
tell(`opening the board for the first time took the server ${(opening / 1000).toFixed(1)} s of CPU`)
const rows: Awaited<ReturnType<typeof compared>>[] = []
for (const comparison of comparisons(setting)) {
  rows.push(await compared(comparison, database))
  tell(comparison.name)
}
const figures = rows.map(([figure]) => figure)
console.log(options.json ? JSON.stringify({ figures }) : `\n${table(rows)}`)
for (const server of [setting.application, setting.applicationOnSmall, setting.bare]) await server.stop()

// What was missed is profiled at once, so that a report says where the time goes.
for (const [index, { name, met }] of figures.entries()) {
  if (met && !(options.profile && index === 0)) continue
  const says = await profiled(name, {
    folder: options.profile ? 'build/profiles' : folder,
    env: applicationEnv,
    sideOn(server) {
      const same = comparisons({ ...setting, application: server })[index]
      if (!same) throw new RangeError('The comparisons have changed')
      return same.ours
    },
  })
  process[options.json ? 'stderr' : 'stdout'].write(`\n${says}\n`)
}
process.exit()

function tell(what: string) {
  process.stderr.write(`${((performance.now() - startedAt) / 1000).toFixed(0).padStart(4)} s  ${what}\n`)
}

import { mkdtempSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { inject } from 'vitest'

// Read by app/env.server.ts, which the tests import later. One database for each worker, so that files run side by side.
const database = `cannulary_w${process.env.VITEST_POOL_ID}`
process.env.DATABASE_URL = `${inject('appServer')}/${database}`
process.env.DATABASE_OWNER_URL = `${inject('ownerServer')}/${database}`
process.env.SESSION_SECRET = 'a secret for tests alone, 40 characters.'
process.env.HOSPITAL_TIME_ZONE = 'Europe/London'
process.env.CANNULARY_DATA = mkdtempSync(join(tmpdir(), 'cannulary-data-'))

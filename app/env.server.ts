import { resolve } from 'node:path'
import { z } from 'zod'

const schema = z.object({
  /** Where the application reads and writes, as the database user without the right to change an entry. */
  DATABASE_URL: z.url({ protocol: /^(mariadb|mysql)$/ }),
  /** Migrates, and grants rights to the user above. The same server; by default the same user. */
  DATABASE_OWNER_URL: z.url({ protocol: /^(mariadb|mysql)$/ }).optional(),
  /** The zone in which the hospital's clocks run: an IANA name. */
  HOSPITAL_TIME_ZONE: z.string().refine(isTimeZone, 'is no IANA time zone').default('Europe/London'),
  /** Signs cookies. At least 32 characters. */
  SESSION_SECRET: z.string().min(32),
  /** Folder of what is kept in files, such as photographs. */
  CANNULARY_DATA: z.string().min(1).default('.data'),
  HOST: z.string().min(1).default('127.0.0.1'),
  PORT: z.coerce.number().int().min(0).max(65_535).default(3000),
  /** `when told`: npm start brings the database up to date while the server loads, and then sends it a message. */
  LISTEN: z.enum(['at once', 'when told']).default('at once'),
  NODE_ENV: z.enum(['production', 'development', 'test']).default('production'),
})

/**
 * The settings of this process, checked when the application starts; nothing else in the application reads
 * `process.env`. A missing or wrong setting ends the start with its name.
 */
export const env = settings(process.env)

function settings(from: NodeJS.ProcessEnv) {
  const { data, error } = schema.safeParse(from)
  if (error) {
    const problems = error.issues.map(issue => `${issue.path.join('.')}: ${issue.message}`)
    throw new Error(`The environment is not right. ${problems.join('; ')}. "npm start" sets what is missing.`)
  }
  return {
    databaseUrl: data.DATABASE_URL,
    databaseOwnerUrl: data.DATABASE_OWNER_URL ?? data.DATABASE_URL,
    hospitalTimeZone: data.HOSPITAL_TIME_ZONE,
    sessionSecret: data.SESSION_SECRET,
    dataFolder: resolve(data.CANNULARY_DATA),
    host: data.HOST,
    port: data.PORT,
    listens: data.LISTEN,
    isProduction: data.NODE_ENV === 'production',
  }
}

function isTimeZone(name: string) {
  try {
    new Intl.DateTimeFormat('en', { timeZone: name })
    return true
  } catch {
    return false
  }
}

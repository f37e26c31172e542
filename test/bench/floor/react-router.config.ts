import type { Config } from '@react-router/dev/config'
import application from '../../../react-router.config.ts'

export default { ...application, buildDirectory: '../../../build/floor' } satisfies Config

import dayjs from 'dayjs'
import utc from 'dayjs/plugin/utc.js'

dayjs.extend(utc)

/** Calendar arithmetic that runs in UTC alone, so that the zone of the server or the browser never takes part. */
export const utcDate: (at: number | string) => dayjs.Dayjs = at => dayjs.utc(at)

import pino from 'pino'
import { logLevel } from './env'

/** The one log: a line of JSON an event, on standard output. Never given a key, cookie, password or URDF body. */
export const log = pino({ level: logLevel(), base: undefined, timestamp: pino.stdTimeFunctions.isoTime })

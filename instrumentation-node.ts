import { database, type Database } from '@/db/client'
import { fillRegister } from '@/db/queries/register'
import { endReaders } from '@/lib/catalog/reader-pool'
import { objectStore, sessionSecret } from '@/lib/env'
import { log } from '@/lib/log'
import { announceSetup } from '@/lib/teams/setup-code'

/** Opens and migrates the database before the first request, or ends the process: Next would otherwise keep listening
 *  and answer 500 to everything. */
export async function start(): Promise<void> {
  try {
    sessionSecret()
    objectStore()
    const opened = await database()
    closeOnSignal(opened)
    await fillRegister(opened.db)
    log.info({ database: opened.kind }, 'database ready')
    const code = await announceSetup()
    // The code opens an empty installation to whoever reads this log, and to nobody else; it is void after its use.
    if (code !== null) log.warn(`setup code: ${code}`)
  } catch (error) {
    log.fatal(`cannot start: ${sentenceOf(error)}`)
    process.exit(1)
  }
}

/** One sentence for the operator. A database error is wrapped by the query builder; the cause says what happened. */
function sentenceOf(error: unknown): string {
  if (!(error instanceof Error)) return String(error)
  const inner = error.cause instanceof Error ? error.cause : error
  const code = (inner as NodeJS.ErrnoException).code
  return inner.message || (code === undefined ? inner.name : `the database answers ${code}`)
}

/** npm scripts start Next with NEXT_MANUAL_SIG_HANDLE, so that closing is ours and what is pending gets written. A signal
 *  may come twice (from the terminal and from npm): the second one changes nothing. */
function closeOnSignal(opened: Database): void {
  let isClosing = false
  const close = async (signal: string) => {
    if (isClosing) return
    isClosing = true
    try {
      await endReaders()
      await opened.close()
      log.info(`database closed on ${signal}`)
      process.exit(0)
    } catch (error) {
      log.fatal(`the database did not close cleanly: ${sentenceOf(error)}`)
      process.exit(1)
    }
  }
  for (const signal of ['SIGTERM', 'SIGINT'] as const) process.on(signal, () => void close(signal))
}

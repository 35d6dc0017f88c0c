import { getDb } from '@/db/client'
import { ping } from '@/db/queries/ping'
import { log } from '@/lib/log'

/** 200 while the database answers and its migrations are applied (it is opened no other way), 503 otherwise. */
export async function answerReady(): Promise<Response> {
  const headers = { 'cache-control': 'no-store' }
  try {
    await ping(await getDb())
    return Response.json({ status: 'ready' }, { headers })
  } catch (error) {
    log.error({ error: String(error) }, 'not ready')
    return Response.json({ status: 'not-ready' }, { status: 503, headers })
  }
}

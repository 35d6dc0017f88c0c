export const dynamic = 'force-dynamic'

export const GET = (): Response => Response.json({ status: 'live' }, { headers: { 'cache-control': 'no-store' } })

import { answerReady } from '@/lib/http/ready'

export const dynamic = 'force-dynamic'

export const GET = answerReady

import { methods } from '@/lib/http/methods'
import { marked } from '@/lib/http/route-handler'
import { buildDocument } from '@/openapi/document'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = methods({ GET: marked(() => Response.json(buildDocument())) })

import { Problem, PROBLEMS } from '@/lib/errors'
import { problemResponse } from './problem-response'
import { marked, type RouteHandler } from './route-handler'

const METHODS = ['GET', 'HEAD', 'OPTIONS', 'POST', 'PUT', 'PATCH', 'DELETE'] as const
type Method = (typeof METHODS)[number]

/** The handlers of one path: those given, OPTIONS, HEAD where there is GET, and for every other method a problem with
 *  Allow, which the framework would leave out. */
export function methods(given: Partial<Record<Method, RouteHandler>>): Record<Method, RouteHandler> {
  const handlers = new Map(Object.entries(given))
  const get = handlers.get('GET')
  if (get !== undefined) {
    handlers.set('HEAD', async (request, context) => {
      const { status, headers, body } = await get(request, context)
      void body?.cancel()
      return new Response(null, { status, headers })
    })
  }
  const allow = [...handlers.keys(), 'OPTIONS'].join(', ')
  handlers.set('OPTIONS', marked(() => new Response(null, { status: 204, headers: { allow } })))
  const detail = `${PROBLEMS['method-not-allowed'].meaning} Here: ${allow}.`
  const refuse = marked((mark) => problemResponse(new Problem('method-not-allowed', detail, { headers: { allow } }), mark))
  return Object.fromEntries(METHODS.map((method) => [method, handlers.get(method) ?? refuse])) as Record<Method, RouteHandler>
}

import { z } from 'zod'

/** application/problem+json (RFC 9457) as this service answers it. */
export const ProblemSchema = z
  .looseObject({
    type: z.string().meta({ description: 'A page that explains it.', example: '/docs/problems/model-not-found' }),
    title: z.string(),
    status: z.int(),
    detail: z.string().meta({ description: 'What is wrong here and what to do.' }),
    instance: z.string().meta({ description: 'The path of the request.' }),
    requestId: z.string(),
    errors: z.array(z.strictObject({ pointer: z.string(), detail: z.string() })).optional(),
  })
  .meta({ id: 'Problem' })

import { Problem, PROBLEMS } from '@/lib/errors'
import { problemResponse } from './problem-response'
import { marked } from './route-handler'

/** Answers every path of the API that no operation has: a problem, where the framework would show a page. */
export const notFound = marked((mark) => problemResponse(new Problem('not-found', PROBLEMS['not-found'].meaning), mark))

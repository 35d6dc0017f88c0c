/** What a page asks of a use-case that only reads: the things of its address, and a query where the operation takes one. */
export const reading = <At, Query = undefined>(at: At, query?: Query) => ({ at, query: query as Query, body: undefined, form: undefined, file: undefined })

/** Address of a revision's sheet. */
export const revisionHref = (team: string, model: string, revision: number | string): string => `/teams/${team}/models/${model}/revisions/${revision}`

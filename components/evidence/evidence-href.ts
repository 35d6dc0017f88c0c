import { revisionHref } from '@/components/import/revision-href'

interface EvidencePath {
  readonly team: string
  readonly model: string
  readonly revision: number
}

/** Address of a set of reference poses, or of the page that adds one. */
export const posesHref = ({ team, model, revision }: EvidencePath, set: number | 'new'): string => `${revisionHref(team, model, revision)}/reference-poses/${set}`

/** Address of the check vectors of a revision in the API, to be saved. */
export const checkVectorsHref = ({ team, model, revision }: EvidencePath, format: 'json' | 'csv'): string =>
  `/api/v1${revisionHref(team, model, revision)}/check-vectors?format=${format}`

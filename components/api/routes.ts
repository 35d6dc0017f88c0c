import type { OperationName, Operations } from '@/lib/contract/operations'

/** Method and path of every operation that a page calls. The contract checks each line, and its schemas stay out of
 *  the browser's bundle. */
export const ROUTES = {
  listModels: ['GET', '/teams/{team}/models'],
  createModel: ['POST', '/teams/{team}/models'],
  checkImport: ['POST', '/teams/{team}/imports/check'],
  createRevision: ['POST', '/teams/{team}/models/{model}/revisions'],
  getSource: ['GET', '/teams/{team}/models/{model}/revisions/{revision}/source'],
  getMesh: ['GET', '/teams/{team}/models/{model}/revisions/{revision}/meshes/{path}'],
  exportModel: ['GET', '/teams/{team}/models/{model}/export'],
  getFindings: ['GET', '/teams/{team}/models/{model}/revisions/{revision}/findings'],
  transitionRevision: ['POST', '/teams/{team}/models/{model}/revisions/{revision}/transitions'],
  addReferencePoses: ['POST', '/teams/{team}/models/{model}/revisions/{revision}/reference-poses'],
  checkReferencePoses: ['POST', '/teams/{team}/models/{model}/revisions/{revision}/reference-poses/check'],
  listKeys: ['GET', '/teams/{team}/keys'],
  createKey: ['POST', '/teams/{team}/keys'],
  getKey: ['GET', '/teams/{team}/keys/{key}'],
  editKey: ['PATCH', '/teams/{team}/keys/{key}'],
  revokeKey: ['DELETE', '/teams/{team}/keys/{key}'],
} as const satisfies { readonly [N in OperationName]?: readonly [Operations[N]['method'], Operations[N]['path']] }

export type CalledName = keyof typeof ROUTES

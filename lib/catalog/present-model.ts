import type { ModelRow } from '@/db/queries/models'
import type { Model } from '@/lib/contract/model'

/** A model as the contract shows it. */
export function presentModel({ model, latest }: ModelRow): Model {
  return {
    slug: model.slug,
    name: model.name,
    ...(model.note === null ? {} : { note: model.note }),
    createdAt: model.createdAt.toISOString(),
    changedAt: model.changedAt.toISOString(),
    ...(model.archivedAt === null ? {} : { archivedAt: model.archivedAt.toISOString() }),
    revisions: model.latest,
    latest: { revision: model.latest, ...latest },
    ...(model.released === null ? {} : { released: model.released }),
  }
}

import { createRevision } from '@/lib/catalog/create-revision'
import { listRevisions } from '@/lib/catalog/list-revisions'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ listRevisions, createRevision })

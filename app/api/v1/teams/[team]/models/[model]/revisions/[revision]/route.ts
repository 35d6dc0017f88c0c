import { getRevision } from '@/lib/catalog/get-revision'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ getRevision })

import { listUses } from '@/lib/catalog/list-uses'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ listUses })

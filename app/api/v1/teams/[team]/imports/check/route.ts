import { checkImport } from '@/lib/catalog/check-import'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ checkImport })

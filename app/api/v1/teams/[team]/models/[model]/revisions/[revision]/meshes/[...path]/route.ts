import { getMesh } from '@/lib/catalog/get-mesh'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ getMesh })

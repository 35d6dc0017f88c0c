import { transitionRevision } from '@/lib/catalog/transition-revision'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ transitionRevision })

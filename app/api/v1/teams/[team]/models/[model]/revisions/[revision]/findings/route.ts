import { getFindings } from '@/lib/catalog/get-findings'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ getFindings })

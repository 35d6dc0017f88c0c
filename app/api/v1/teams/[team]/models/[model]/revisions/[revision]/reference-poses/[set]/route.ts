import { getReferencePoses } from '@/lib/compute/get-reference-poses'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ getReferencePoses })

import { checkReferencePoses } from '@/lib/compute/check-reference-poses'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ checkReferencePoses })

import { addReferencePoses } from '@/lib/compute/add-reference-poses'
import { listReferencePoses } from '@/lib/compute/list-reference-poses'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ listReferencePoses, addReferencePoses })

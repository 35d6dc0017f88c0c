import { editKey } from '@/lib/keys/edit-key'
import { getKey } from '@/lib/keys/get-key'
import { revokeKey } from '@/lib/keys/revoke-key'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ getKey, editKey, revokeKey })

import { createKey } from '@/lib/keys/create-key'
import { listKeys } from '@/lib/keys/list-keys'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ listKeys, createKey })

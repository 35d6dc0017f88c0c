import { createModel } from '@/lib/catalog/create-model'
import { listModels } from '@/lib/catalog/list-models'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ listModels, createModel })

import { archiveModel } from '@/lib/catalog/archive-model'
import { editModel } from '@/lib/catalog/edit-model'
import { getModel } from '@/lib/catalog/get-model'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ getModel, editModel, archiveModel })

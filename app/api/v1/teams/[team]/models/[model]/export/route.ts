import { exportModel } from '@/lib/export/export-model'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ exportModel })

import { compareRevisions } from '@/lib/compute/compare-revisions'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ compareRevisions })

import { answerNullSpace } from '@/lib/compute/answer-null-space'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ nullSpace: answerNullSpace })

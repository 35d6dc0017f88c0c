import { answerCheckVectors } from '@/lib/compute/answer-check-vectors'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ getCheckVectors: answerCheckVectors })

import { answerJacobian } from '@/lib/compute/answer-jacobian'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ jacobian: answerJacobian })

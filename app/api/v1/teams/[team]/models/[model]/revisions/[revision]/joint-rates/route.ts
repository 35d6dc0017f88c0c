import { answerJointRates } from '@/lib/compute/answer-joint-rates'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ jointRates: answerJointRates })

import { answerInverseKinematics } from '@/lib/compute/answer-inverse-kinematics'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ inverseKinematics: answerInverseKinematics })

import { answerForwardKinematics } from '@/lib/compute/answer-forward-kinematics'
import { resource } from '@/lib/http/resource'

export const { GET, HEAD, OPTIONS, POST, PUT, PATCH, DELETE } = resource({ forwardKinematics: answerForwardKinematics })

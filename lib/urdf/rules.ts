import { ARCHIVE_RULES } from '@/lib/urdf/rules-of-archive'
import { MODEL_RULES } from '@/lib/urdf/rules-of-model'
import { NOTE_RULES } from '@/lib/urdf/rules-of-note'
import { TEXT_RULES } from '@/lib/urdf/rules-of-text'
import { WARNING_RULES } from '@/lib/urdf/rules-of-warning'

/** The one table of findings: a new rule is a row in one of these five and a check that reports it. Slugs never change. */
export const RULES = { ...ARCHIVE_RULES, ...TEXT_RULES, ...MODEL_RULES, ...WARNING_RULES, ...NOTE_RULES } as const

export type RuleId = keyof typeof RULES

import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import { EffectSentence } from '@/components/comparison/effect-sentence'
import type { Comparison } from '@/lib/contract/comparison'

const side = (revision: number) => ({ revision, status: 'draft' as const, fingerprint: '0'.repeat(64) })
const size = (max: number) => ({ max, mean: max, p95: max })

const sentence = (sameKinematics: boolean, moves = 0, turns = 0) => {
  const comparison: Comparison = {
    from: side(2),
    to: side(3),
    sameKinematics,
    chain: { base: 'a', tip: 'b', joints: [], types: [], former: { base: 'a', tip: 'b', joints: [] }, held: [] },
    effect: { samples: 1, seed: 1, translation: size(moves), rotation: size(turns) },
    limits: [],
    changes: [],
  }
  return renderToStaticMarkup(<EffectSentence comparison={comparison} />).replaceAll(/<[^>]+>/g, '')
}

describe('the sentence at the head of a comparison', () => {
  it('says by how much the tip moves and turns', () => expect(sentence(false, 0.0032, Math.PI / 180)).toBe('For the same joint values the tip moves by up to 3.200 mm and turns by up to 1.0000 °.'))
  it('does not pass off what is small as nothing', () => expect(sentence(false, 1e-8, 0)).toBe('For the same joint values the tip moves by less than 0.001 mm and does not turn.'))
  it('says that the pose is the same where only something else changed', () => expect(sentence(false)).toContain('the tip stands at the same pose'))
  it('says that nothing kinematic changed where the fingerprints agree', () => expect(sentence(true)).toBe('No kinematic change: revisions 2 and 3 compute the same numbers.'))
})

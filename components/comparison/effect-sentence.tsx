import type { Comparison } from '@/lib/contract/comparison'
import { EffectQuantity } from './effect-quantity'

/** What the approver has to know, in one sentence. */
export function EffectSentence({ comparison: { sameKinematics, effect, from, to } }: { readonly comparison: Comparison }) {
  if (sameKinematics) {
    return (
      <p className="text-18 leading-7 font-semibold text-balance">
        No kinematic change: revisions <span className="num">{from.revision}</span> and <span className="num">{to.revision}</span> compute the same numbers.
      </p>
    )
  }
  const { translation, rotation } = effect
  if (translation.max === 0 && rotation.max === 0) {
    return (
      <p className="text-18 leading-7 font-semibold text-balance">
        For the same joint values the tip stands at the same pose, at every configuration compared. What changed is listed below.
      </p>
    )
  }
  return (
    <p className="text-18 leading-7 font-semibold text-balance">
      For the same joint values the tip{' '}
      {translation.max === 0 ? (
        'does not move'
      ) : (
        <>
          moves <EffectQuantity value={translation.max} kind="length" inSentence />
        </>
      )}{' '}
      and{' '}
      {rotation.max === 0 ? (
        'does not turn'
      ) : (
        <>
          turns <EffectQuantity value={rotation.max} kind="angle" inSentence />
        </>
      )}
      .
    </p>
  )
}

import { Mark } from './marks'

type JointTypeName = 'revolute' | 'continuous' | 'prismatic' | 'fixed' | 'floating' | 'planar'

/** Type of a joint: mark and URDF's word. */
export function JointType({ type }: { readonly type: JointTypeName }) {
  return (
    <span className="inline-flex items-baseline gap-1.5 whitespace-nowrap">
      <Mark name={type} className="size-4 shrink-0 self-center text-soft" />
      {type}
    </span>
  )
}

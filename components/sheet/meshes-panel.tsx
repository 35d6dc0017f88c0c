import { addressOf } from '@/components/api/address'
import { meshCountText, MeshTable } from '@/components/import/mesh-table'
import type { MeshReference } from '@/lib/contract/mesh'

interface MeshesPanelProps {
  readonly path: { readonly team: string; readonly model: string; readonly revision: number }
  readonly meshes: readonly MeshReference[]
}

/** The meshes that the description refers to, and where they are. */
export function MeshesPanel({ path, meshes }: MeshesPanelProps) {
  return (
    <section aria-labelledby="sheet-meshes" className="min-w-0">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <h2 id="sheet-meshes">Meshes</h2>
        <span className="label">{meshCountText(meshes)}</span>
      </div>
      <MeshTable meshes={meshes} hrefOf={(mesh) => addressOf('getMesh', { ...path, path: mesh })} />
    </section>
  )
}

import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import { meshCountText, MeshTable } from '@/components/import/mesh-table'
import type { MeshReference } from '@/lib/contract/mesh'

const MESHES: readonly MeshReference[] = [
  { filename: 'package://arm/base.stl', state: 'found', path: 'arm/a b.stl', size: 20480 },
  { filename: 'gone.stl', state: 'missing' },
  { filename: '/srv/upper.stl', state: 'outside' },
]

describe('MeshTable', () => {
  it('says of each mesh where it is, or that it is missing or outside', () => {
    const text = renderToStaticMarkup(<MeshTable meshes={MESHES} />)
    expect(text).toMatch(/package:\/\/arm\/base\.stl.*arm\/a b\.stl.*20 KiB.*gone\.stl.*missing.*\/srv\/upper\.stl.*outside, not followed/)
    expect(text).not.toContain('<a ')
    expect(meshCountText(MESHES)).toBe('1 of 3 found')
  })

  it('links those that are stored', () => {
    expect(renderToStaticMarkup(<MeshTable meshes={MESHES} hrefOf={(path) => `/m/${encodeURIComponent(path)}`} />).match(/href="[^"]*"/g)).toEqual(['href="/m/arm%2Fa%20b.stl"'])
  })

  it('shows the first 200 and says how many there are besides', () => {
    const many = Array.from({ length: 203 }, (_, i): MeshReference => ({ filename: `m${i}.stl`, state: 'missing' }))
    const text = renderToStaticMarkup(<MeshTable meshes={many} />)
    expect(text.match(/<tr>/g)).toHaveLength(201)
    expect(text).toContain('3 more are in the API.')
  })
})

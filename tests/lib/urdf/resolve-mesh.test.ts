import { describe, expect, it } from 'vitest'
import { leadsOutside, resolveMesh } from '@/lib/urdf/resolve-mesh'

const FILES = ['arm/urdf/arm.urdf', 'arm/meshes/visual/base.stl', 'arm/meshes/collision/base.stl', 'arm/meshes/Fore Arm.dae', 'link.obj']

describe('resolveMesh', () => {
  it.each([
    ['package://arm/meshes/visual/base.stl', 'arm/meshes/visual/base.stl'],
    ['package://other/meshes/collision/base.stl', 'arm/meshes/collision/base.stl'],
    ['package://robots/arm/meshes/visual/base.stl', 'arm/meshes/visual/base.stl'],
    ['meshes/visual/base.stl', 'arm/meshes/visual/base.stl'],
    ['./meshes/visual//base.stl', 'arm/meshes/visual/base.stl'],
    ['meshes\\Fore Arm.dae', 'arm/meshes/Fore Arm.dae'],
    [' package://arm/meshes/Fore Arm.dae\n', 'arm/meshes/Fore Arm.dae'],
    ['package://arm/meshes/link.obj', 'link.obj'],
  ])('finds %j at %s', (filename, file) => {
    for (const files of [FILES, FILES.toReversed()]) expect(resolveMesh(filename, files)).toBe(file)
  })

  it.each(['meshes/other/base.stl', 'package://arm/textures/base.stl', 'Base.stl', 'package://arm/meshes', 'package://', '', '.', '/link.obj', '../link.obj', 'file:link.obj'])(
    'finds nothing for %j',
    (filename) => expect(resolveMesh(filename, FILES)).toBeNull(),
  )

  it('takes of files with equal ends the shortest path, then the first by name', () => {
    expect(resolveMesh('a.stl', ['y/a.stl', 'x/a.stl', 'b/c/a.stl'])).toBe('x/a.stl')
  })
})

describe('leadsOutside', () => {
  it.each(['/a.stl', '\\a.stl', 'C:\\a.stl', 'c:/a.stl', 'file:///a.stl', 'http://meshes.example/a.stl', 'model://arm/a.stl', '..', 'a/../../b.stl', 'a\\..\\b.stl', 'package://arm/../a.stl', 'package:///a.stl', 'package://file:///a.stl'])(
    'says so of %j',
    (filename) => expect(leadsOutside(filename)).toBe(true),
  )

  it.each(['a.stl', 'a/b.stl', 'package://arm/a.stl', 'a..b/c.stl', '', 'Fore Arm.dae'])('does not say so of %j', (filename) => {
    expect(leadsOutside(filename)).toBe(false)
  })
})

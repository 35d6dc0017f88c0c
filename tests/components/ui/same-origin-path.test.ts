import { describe, expect, it } from 'vitest'
import { sameOriginPath } from '@/components/ui/same-origin-path'

const SITE = 'http://127.0.0.1:3000'

describe('sameOriginPath', () => {
  it('keeps path and query of an address of this site', () => {
    expect(sameOriginPath('/teams/tarnholm?query=skerry', SITE)).toBe('/teams/tarnholm?query=skerry')
    expect(sameOriginPath(`${SITE}/docs`, SITE)).toBe('/docs')
  })

  it.each(['https://elsewhere.example/', '//elsewhere.example/x', '/\\elsewhere.example', '\\\\elsewhere.example', 'javascript:alert(1)', 'http://127.0.0.1:3001/', 'http://[', '', null])(
    'refuses to lead to %s',
    (target) => {
      expect(sameOriginPath(target, SITE)).toBeNull()
    },
  )
})

import type { Report } from '@/lib/urdf/report'
import type { UnusedElements } from '@/lib/urdf/unused-elements'

/** What the readers of elements share. */
export interface Reading {
  readonly text: string
  readonly report: Report
  readonly version: '1.0' | '1.1' | '1.2'
  readonly unused: UnusedElements
  /** False when the text holds nothing that xacro would put a value in. */
  readonly hasMacros: boolean
}

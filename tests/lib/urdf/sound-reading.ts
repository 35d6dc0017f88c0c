import { CheckedImport } from '@/lib/contract/description'
import { presentStructure } from '@/lib/catalog/present-structure'
import { Problem } from '@/lib/errors'
import { createWorkspace } from '@/lib/kinematics/create-workspace'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { compileChain } from '@/lib/urdf/compile-chain'
import { defaultChain } from '@/lib/urdf/default-chain'
import type { Description } from '@/lib/urdf/description'
import { fingerprint } from '@/lib/urdf/fingerprint'
import { parseUrdf } from '@/lib/urdf/parse-urdf'

/** Reads a file and checks what must hold of any file at all; throws a sentence where it does not. Answers whether it was accepted. */
export function expectSoundReading(bytes: Uint8Array): boolean {
  const { description, findings } = parseUrdf(bytes)
  demand((description === null) === findings.some(({ severity }) => severity === 'error'), 'a file is refused if and only if a finding is an error')
  const lines = linesOf(bytes)
  for (const { rule, line, column, message, remedy } of findings) {
    demand(line >= 1 && line <= lines.length, `${rule} is in line ${line} of ${lines.length}`)
    demand(column >= 1 && column <= [...lines[line - 1]!].length + 1, `${rule} is in column ${column} of ${[...lines[line - 1]!].length}`)
    demand(message !== '' && remedy !== '', `${rule} says nothing`)
  }
  const again = parseUrdf(bytes)
  demand(JSON.stringify({ description, findings }) === JSON.stringify(again), 'the same bytes were read twice in different ways')
  const structure = description === null ? {} : { structure: presentStructure(description, { fingerprint: fingerprint(description), sourceDigest: '0'.repeat(64) }) }
  CheckedImport.parse({ findings, ...structure })
  if (description !== null) demandFiniteNumbers(description)
  return description !== null
}

function demand(holds: boolean, sentence: string): void {
  if (!holds) throw new Error(sentence)
}

/** The lines of a file however broken, with a stand-in for bytes that do not belong. */
function linesOf(bytes: Uint8Array): string[] {
  const [a, b] = bytes
  const encoding = (a === 0xff && b === 0xfe) || (a === 0x3c && b === 0) ? 'utf-16le' : (a === 0xfe && b === 0xff) || (a === 0 && b === 0x3c) ? 'utf-16be' : 'utf-8'
  return new TextDecoder(encoding).decode(bytes).split(/\r\n|\r|\n/)
}

function demandFiniteNumbers(description: Description): void {
  if (defaultChain(description) === null) {
    try {
      compileChain(description)
    } catch (error) {
      demand(error instanceof Problem && error.code === 'chain-not-computable', `compiling failed otherwise: ${error as Error}`)
    }
    return
  }
  const chain = compileChain(description)
  const bounds = chain.joints.flatMap(({ lower, upper, rate }) => [lower, upper, rate]).filter((bound) => bound !== null)
  const parts = [...chain.constants.flat(), ...chain.motions.flatMap(({ axis, multiplier, offset }) => [...axis, multiplier, offset]), ...bounds]
  demand(parts.every(Number.isFinite), 'a number of the compiled chain is not finite')
  const work = createWorkspace(chain)
  forwardKinematics(chain, new Float64Array(chain.joints.length), work)
  demand(work.baseFromTip.every(Number.isFinite), 'the pose at zero is not finite')
}

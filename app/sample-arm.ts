import { readFile } from 'node:fs/promises'
import path from 'node:path'
import type { Chain } from '@/lib/kinematics/chain'
import { compileChain } from '@/lib/urdf/compile-chain'
import { parseUrdf } from '@/lib/urdf/parse-urdf'

let compiled: Promise<Chain> | undefined

async function read(): Promise<Chain> {
  const bytes = await readFile(path.join(process.cwd(), 'samples', 'skerry-7.urdf'))
  const { description } = parseUrdf(new Uint8Array(bytes))
  if (description === null) throw new Error('the sample arm does not import')
  return compileChain(description)
}

/** The sample arm of the front page: read as an import would read it, once. */
export function sampleArm(): Promise<Chain> {
  compiled ??= read()
  return compiled
}

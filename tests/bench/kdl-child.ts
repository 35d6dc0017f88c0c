import { execFileSync, spawn } from 'node:child_process'
import { existsSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { createInterface } from 'node:readline'
import type { Chain } from '@/lib/kinematics/chain'

const HEADER = '/usr/include/kdl/chain.hpp'

/** A compiled Orocos KDL that answers how long a question takes it. */
export interface Kdl {
  load(chain: Chain, configurations: readonly Float64Array[]): void
  /** Nanoseconds a call, over `count` calls. */
  time(question: string, count: number): Promise<number>
  end(): void
}

/** Compiles the program beside this file and starts it; null, with a reason, where that cannot be done. */
export function startKdl(): Kdl | { readonly missing: string } {
  const root = process.getuid?.() === 0
  if (!existsSync(HEADER) && root) {
    try {
      execFileSync('apt-get', ['install', '-y', '--no-install-recommends', 'g++', 'liborocos-kdl-dev', 'libeigen3-dev'], { stdio: 'ignore' })
    } catch {
      // Said below.
    }
  }
  if (!existsSync(HEADER)) return { missing: 'liborocos-kdl-dev is not installed (apt-get install g++ liborocos-kdl-dev libeigen3-dev)' }
  const folder = mkdtempSync(path.join(tmpdir(), 'kdl-'))
  const program = path.join(folder, 'kdl')
  try {
    execFileSync('g++', ['-O3', '-I/usr/include/eigen3', path.join(import.meta.dirname, 'kdl.cpp'), '-o', program, '-lorocos-kdl'], { stdio: 'pipe' })
  } catch (error) {
    rmSync(folder, { recursive: true })
    return { missing: `the program does not compile: ${error instanceof Error ? error.message : String(error)}` }
  }
  const child = spawn(program, { stdio: ['pipe', 'pipe', 'inherit'] })
  const lines = createInterface({ input: child.stdout })[Symbol.asyncIterator]()
  return {
    load(chain, configurations) {
      const joints = chain.motions.map(({ axis }, i) => [...chain.constants[i]!, ...axis].join(' '))
      child.stdin.write(`chain ${joints.length}\n${joints.join('\n')}\n${chain.constants.at(-1)!.join(' ')}\n`)
      child.stdin.write(`configurations ${configurations.length}\n${configurations.map((q) => q.join(' ')).join('\n')}\n`)
    },
    async time(question, count) {
      child.stdin.write(`${question} ${count}\n`)
      const { value } = (await lines.next()) as { value: string }
      return Number(value.split(' ')[0])
    },
    end() {
      child.stdin.end()
      rmSync(folder, { recursive: true })
    },
  }
}

import { execFileSync } from 'node:child_process'
import path from 'node:path'

/** Debian's python, which is the one that python3-pykdl and python3-numpy are installed for. */
const PYTHON = '/usr/bin/python3'

/** Puts a question to one of the witnesses beside this file, and reads its answer. */
export function askPython<T>(script: 'kdl.py' | 'linear-algebra.py' | 'tip-effect.py', question: unknown): T {
  const answer = execFileSync(PYTHON, [path.join(import.meta.dirname, script)], { input: JSON.stringify(question), maxBuffer: 512 * 1024 * 1024 })
  return JSON.parse(answer.toString()) as T
}

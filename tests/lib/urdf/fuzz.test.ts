import { readdirSync, readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, it } from 'vitest'
import { RULES } from '@/lib/urdf/rules'
import { mulberry32, mutated } from './mutate'
import { expectSoundReading } from './sound-reading'
import { bytesOf } from './urdf-text'

/** FUZZ_SAMPLES asks for more mutants than the 40 000 of every run, FUZZ_SEED for others. */
const SAMPLES = Number(process.env.FUZZ_SAMPLES ?? 40_000)
const SEED = Number(process.env.FUZZ_SEED ?? 1)
const BLOCK = 1000

const FOLDERS = ['samples', 'tests/reference/arms']
const files = FOLDERS.flatMap((folder) => readdirSync(folder).filter((name) => name.endsWith('.urdf')).map((name) => path.join(folder, name)))
/** Whole robots, and the small examples of every rule. */
const SOURCES = [files.map((file) => new Uint8Array(readFileSync(file))), Object.values(RULES).flatMap(({ before, after }) => [bytesOf(before), bytesOf(after)])]

describe('a mutant of a file', () => {
  const blocks = Array.from({ length: Math.ceil(SAMPLES / BLOCK) }, (_, block) => block)
  let accepted = 0
  it.each(blocks)('is read without a crash, with findings that have a place, and computes finite numbers: thousand %i', { timeout: 120_000 }, (block) => {
    for (let i = block * BLOCK; i < (block + 1) * BLOCK; i++) {
      const random = mulberry32(SEED * 1_000_003 + i)
      const pick = (): Uint8Array => {
        const sources = SOURCES[random() < 0.6 ? 0 : 1]!
        return sources[Math.floor(sources.length * random())]!
      }
      const mutant = mutated(pick(), pick(), random)
      try {
        if (expectSoundReading(mutant)) accepted++
      } catch (error) {
        // In base64, so that it can be looked at and become a test of its own.
        throw new Error(`mutant ${i} of FUZZ_SEED=${SEED}: ${(error as Error).message}\n${Buffer.from(mutant).toString('base64')}`, { cause: error })
      }
    }
    expect(block).toBeLessThan(blocks.length)
  })

  it('is accepted often enough for the numbers to be tried, and refused often enough', () => {
    expect(accepted).toBeGreaterThan(SAMPLES / 20)
    expect(accepted).toBeLessThan((SAMPLES * 19) / 20)
  })
})

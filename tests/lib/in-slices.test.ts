import { describe, expect, it } from 'vitest'
import { finishInSlices, inSlices } from '@/lib/in-slices'

/** Work that takes at least a millisecond of computing. */
function work(): void {
  const start = performance.now()
  while (performance.now() - start < 1) Math.sqrt(start)
}

describe('inSlices', () => {
  it('does everything once and in order', async () => {
    const seen: number[] = []
    await inSlices(1000, (index) => void seen.push(index))
    expect(seen).toEqual(Array.from({ length: 1000 }, (_, i) => i))
    await inSlices(0, () => expect.unreachable())
  })

  it('gives others their turn before it is done', async () => {
    let turns = 0
    let isRunning = true
    const other = () => {
      turns++
      if (isRunning) setImmediate(other)
    }
    setImmediate(other)
    await inSlices(50, work)
    isRunning = false
    // 50 ms of work in slices of 2: at least a few turns, however slow the machine.
    expect(turns).toBeGreaterThan(3)
  })

  it('stops where the work fails and says why', async () => {
    const seen: number[] = []
    await expect(
      inSlices(10, (index) => {
        seen.push(index)
        if (index === 3) throw new Error('the fourth')
      }),
    ).rejects.toThrow('the fourth')
    expect(seen).toEqual([0, 1, 2, 3])
  })
})

describe('finishInSlices', () => {
  it('answers what the steps return, and gives others their turn in between', async () => {
    let turns = 0
    const timer = setInterval(() => turns++, 0)
    const answer = await finishInSlices(
      (function* () {
        for (let step = 0; step < 50; step++) {
          work()
          yield
        }
        return 'done'
      })(),
    )
    clearInterval(timer)
    expect(answer).toBe('done')
    expect(turns).toBeGreaterThan(3)
  })
})

/** How long work may hold the event loop before others get their turn. API.md allows 10 ms; the rest of it is for the last step
 *  of a slice and for collecting garbage, on machines slower than ours. */
const SLICE_MS = 2

/** The wait until others have had their turn. */
export const passTurn = (): Promise<void> => new Promise((resolve) => setImmediate(resolve))

/** Whether a slice is over, and the wait until the others have had their turn. */
function createTurn() {
  let sliceEnd = performance.now() + SLICE_MS
  return {
    isOver: () => performance.now() >= sliceEnd,
    async pass(): Promise<void> {
      await passTurn()
      sliceEnd = performance.now() + SLICE_MS
    },
  }
}

/** Calls `work(0)` to `work(count - 1)` in order and lets the event loop run in between. */
export async function inSlices(count: number, work: (index: number) => void): Promise<void> {
  const turn = createTurn()
  for (let index = 0; index < count; index++) {
    work(index)
    if (turn.isOver()) await turn.pass()
  }
}

/** Runs `steps` to their end, lets the event loop run in between, and answers what they return. */
export async function finishInSlices<T>(steps: Generator<void, T>): Promise<T> {
  const turn = createTurn()
  for (;;) {
    const step = steps.next()
    if (step.done === true) return step.value
    if (turn.isOver()) await turn.pass()
  }
}

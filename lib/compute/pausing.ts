/** The same steps as pauses of a series, so that what comes before the first result is done in slices, too. */
export function* pausing<T>(steps: Generator<void, T>): Generator<undefined, T> {
  for (;;) {
    const step = steps.next()
    if (step.done === true) return step.value
    yield undefined
  }
}

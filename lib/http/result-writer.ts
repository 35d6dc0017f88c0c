/** What a reply is made of once its results are written. */
export interface Written {
  readonly headers: Readonly<Record<string, string>>
  readonly chunks: readonly (string | Uint8Array)[]
}

/** Writes results in one format, one after the other. */
export interface ResultWriter {
  /** Takes the next result, which has been parsed by its schema. */
  take(result: Readonly<Record<string, unknown>>): void
  /** Ends the writing, pausing now and then. */
  finish(): Generator<void, Written>
}

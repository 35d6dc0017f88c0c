/** Next calls this once, before the first request. The comparison is spelled out here, and not taken from lib/env, because
 *  the bundler replaces it by a constant and so leaves the database out of the edge bundle. */
export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME === 'nodejs') {
    const { start } = await import('./instrumentation-node')
    await start()
  }
}

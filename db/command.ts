import path from 'node:path'

/** Runs a command that takes one file, and says in one sentence what it did or why it did not. */
export async function command(usage: string, act: (file: string) => Promise<string>): Promise<void> {
  const [name, ...more] = process.argv.slice(2)
  if (name === undefined || more.length > 0) {
    process.stderr.write(`Usage: ${usage}\n`)
    process.exitCode = 2
    return
  }
  try {
    process.stdout.write(`${await act(path.resolve(name))}\n`)
  } catch (error) {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`)
    process.exitCode = 1
  }
}

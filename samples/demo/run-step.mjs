import { spawn } from 'node:child_process'

/** Runs a command to its end, showing what it prints. Fails with `sentence` when the command fails. */
export function runStep(command, args, { cwd, env = process.env, sentence }) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { cwd, env, stdio: ['ignore', 'inherit', 'inherit'] })
    const forward = (signal) => child.kill(signal)
    process.on('SIGINT', forward).on('SIGTERM', forward)
    const settle = (act) => {
      process.off('SIGINT', forward).off('SIGTERM', forward)
      act()
    }
    child.once('error', (error) => settle(() => reject(new Error(`${sentence} (${error.message})`))))
    child.once('exit', (code, signal) => settle(() => (code === 0 ? resolve() : reject(new Error(`${sentence} (${signal ?? `exit code ${code}`})`)))))
  })
}

import { spawn } from 'node:child_process'

const running = new Set()

/** Ends everything that a stage has started, by process group. */
export function endStages(signal = 'SIGTERM') {
  for (const child of running) endGroup(child, signal)
}

function endGroup(child, signal) {
  try {
    process.kill(-child.pid, signal)
  } catch (error) {
    if (error.code !== 'ESRCH') throw error
  }
}

/** Runs one program in a process group of its own, showing what it prints (only its errors when quiet), and returns its exit
 *  code. Whatever it leaves running is ended with it, and so is a run that takes longer than it may. */
export function runStage(command, args, { cwd, env, minutes, isQuiet = false }) {
  return new Promise((resolve) => {
    const child = spawn(command, args, { cwd, env, stdio: ['ignore', isQuiet ? 'ignore' : 'inherit', 'inherit'], detached: true })
    running.add(child)
    const timer = setTimeout(() => {
      process.stdout.write(`\n${command} was ended: it ran longer than ${minutes} minutes.\n`)
      endGroup(child, 'SIGKILL')
    }, minutes * 60_000)
    const settle = (code) => {
      clearTimeout(timer)
      running.delete(child)
      if (child.pid !== undefined) endGroup(child, 'SIGKILL')
      resolve(code)
    }
    child.once('error', (error) => {
      process.stdout.write(`${command} cannot be run: ${error.message}\n`)
      settle(127)
    })
    child.once('exit', (code) => settle(code ?? 1))
  })
}

import { spawn } from 'node:child_process'
import { createServer } from 'node:net'
import { join } from 'node:path'
import { setTimeout as pause } from 'node:timers/promises'

/** Fails with a sentence when something else listens at this address. */
export function requireFreePort(host, port) {
  return new Promise((resolve, reject) => {
    const sentences = {
      EADDRINUSE: `Port ${port} is in use by another program. Stop it, or choose another: PORT=${port + 1} npm run demo`,
      EACCES: `Port ${port} may not be opened by this user. Choose one above 1023: PORT=3000 npm run demo`,
      EADDRNOTAVAIL: `HOST=${host} is not an address of this machine.`,
    }
    const probe = createServer().once('error', (error) => reject(new Error(sentences[error.code] ?? error.message)))
    probe.listen(port, host, () => probe.close(() => resolve()))
  })
}

/** Starts Next's server as a child in the foreground and hands its signals on. `mode`: 'start' or 'dev'. */
export function serve(root, mode, { host, port, env }) {
  const program = join(root, 'node_modules/next/dist/bin/next')
  const child = spawn(process.execPath, [program, mode, '-H', host, '-p', String(port)], {
    cwd: root,
    // The development server kills its worker 100 ms after a signal unless told to wait; closing the database takes longer.
    env: { ...env, PORT: String(port), NEXT_MANUAL_SIG_HANDLE: 'true', NEXT_EXIT_TIMEOUT_MS: '15000', NEXT_TELEMETRY_DISABLED: '1' },
    stdio: ['ignore', 'inherit', 'inherit'],
  })
  // The terminal signals the whole group and npm signals its child once more; the server takes the first and ignores the rest.
  let wasTold = false
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
    process.on(signal, () => {
      wasTold = true
      child.kill('SIGTERM')
    })
  }
  const exited = new Promise((resolve) => child.once('exit', (code, signal) => resolve({ code, signal, wasTold })))
  return { child, exited }
}

/** Waits until the server says that it is ready; false when it ended before. */
export async function untilReady(url, exited) {
  let hasEnded = false
  void exited.then(() => (hasEnded = true))
  while (!hasEnded) {
    const answer = await fetch(`${url}/api/health/ready`).catch(() => null)
    if (answer?.ok) return true
    await pause(200)
  }
  return false
}

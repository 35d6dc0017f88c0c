import { readFileSync } from 'node:fs'
import { PerformanceObserver } from 'node:perf_hooks'

// Loaded before the server by --import, so that the product knows nothing of it. A timer that is due every millisecond sees how long the
// event loop was held since it last ran: by the clock, and in computing time of the thread alone, which other programs on a busy
// machine do not lengthen (Linux counts it in schedstat, ns). On each message the probe tells its parent the longest of both and of
// the engine's pauses to collect garbage, in ms, and starts anew.

function computed() {
  // Asking for the usage of the process brings the count of the running thread up to date, which else is done every few ms.
  process.cpuUsage()
  return Number(readFileSync('/proc/thread-self/schedstat', 'latin1').split(' ')[0]) / 1e6
}

let longest = { clock: 0, computing: 0, collecting: 0 }
let before = { clock: performance.now(), computing: computed() }
setInterval(() => {
  const now = { clock: performance.now(), computing: computed() }
  longest.clock = Math.max(longest.clock, now.clock - before.clock)
  longest.computing = Math.max(longest.computing, now.computing - before.computing)
  before = now
}, 1).unref()

new PerformanceObserver((list) => {
  for (const { duration } of list.getEntries()) longest.collecting = Math.max(longest.collecting, duration)
}).observe({ entryTypes: ['gc'] })

process.on('message', () => {
  // Told in a later turn: a hold that is going on is only known once it has ended.
  setTimeout(() => {
    process.send?.(longest)
    longest = { clock: 0, computing: 0, collecting: 0 }
  }, 5)
})

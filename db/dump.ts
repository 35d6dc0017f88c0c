import { dumpTo } from './backup'
import { command } from './command'

await command('npm run dump -- FILE', async (file) => `Wrote ${await dumpTo(file)} bytes to ${file}.`)

import { writeFileSync } from 'node:fs'
import path from 'node:path'
import { buildDocument } from './document'

writeFileSync(path.join(import.meta.dirname, 'openapi.json'), `${JSON.stringify(buildDocument(), null, 2)}\n`)

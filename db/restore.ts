import { restoreFrom } from './backup'
import { command } from './command'
import { embeddedFolder } from './client'

await command('npm run restore -- FILE', async (file) => {
  const migrations = await restoreFrom(file)
  return `Restored ${file} into ${embeddedFolder()} (schema ${migrations}).`
})

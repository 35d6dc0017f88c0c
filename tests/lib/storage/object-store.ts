import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import S3rver from 's3rver'

const BUCKET = 'elbowroom-files'

/** Starts a local object store on a free loopback port. env: what the installation is given to use it. */
export async function startObjectStore() {
  const directory = mkdtempSync(path.join(tmpdir(), 'elbowroom-objects-'))
  const server = new S3rver({ address: '127.0.0.1', port: 0, directory, silent: true, configureBuckets: [{ name: BUCKET }] })
  const { port } = await server.run()
  return {
    directory,
    env: {
      ELBOWROOM_S3_BUCKET: BUCKET,
      ELBOWROOM_S3_ENDPOINT: `http://127.0.0.1:${port}`,
      ELBOWROOM_S3_ACCESS_KEY_ID: 'S3RVER',
      ELBOWROOM_S3_SECRET_ACCESS_KEY: 'S3RVER',
    },
    async stop(): Promise<void> {
      await server.close()
      rmSync(directory, { recursive: true, force: true })
    },
  }
}

declare module 's3rver' {
  import type { AddressInfo } from 'node:net'

  /** A local fake of an S3-compatible object store, on files in `directory`. */
  export default class S3rver {
    constructor(options: { address: string; port: number; directory: string; silent: boolean; configureBuckets: { name: string }[] })
    run(): Promise<AddressInfo>
    close(): Promise<void>
  }
}

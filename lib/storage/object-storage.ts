import { GetObjectCommand, HeadObjectCommand, PutObjectCommand, S3Client } from '@aws-sdk/client-s3'
import type { ObjectStore } from '@/lib/env'
import { placeOf, type Storage } from './storage'

const isMissing = (error: unknown): boolean => (error as { $metadata?: { httpStatusCode?: number } }).$metadata?.httpStatusCode === 404

const orMissing = <T>(asked: Promise<T>): Promise<T | undefined> =>
  asked.catch((error: unknown) => {
    if (isMissing(error)) return undefined
    throw error
  })

/** Longer than this no request may wait for the store to take it up. */
const CONNECT_MS = 5_000

/** Files in a bucket of an S3-compatible object store. The bucket must be there. */
export function objectStorage({ bucket, region, endpoint, credentials }: ObjectStore): Storage {
  const client = new S3Client({
    region,
    ...(endpoint === undefined ? {} : { endpoint, forcePathStyle: true }),
    ...(credentials === undefined ? {} : { credentials }),
    requestHandler: { connectionTimeout: CONNECT_MS },
    // Stores other than the first of their kind do not all know the newer checksums; ours is the name of the object.
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
  })
  const named = (digest: string) => ({ Bucket: bucket, Key: placeOf(digest) })
  const has = async (digest: string) => (await orMissing(client.send(new HeadObjectCommand(named(digest))))) !== undefined
  return {
    has,
    async get(digest) {
      const answer = await orMissing(client.send(new GetObjectCommand(named(digest))))
      return answer === undefined ? null : answer.Body!.transformToByteArray()
    },
    async put(digest, bytes) {
      if (await has(digest)) return
      await client.send(new PutObjectCommand({ ...named(digest), Body: bytes, ContentLength: bytes.length, ContentType: 'application/octet-stream' }))
    },
  }
}

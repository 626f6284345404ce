import {
  GetObjectCommand,
  HeadBucketCommand,
  HeadObjectCommand,
  PutObjectCommand,
  S3Client,
} from '@aws-sdk/client-s3'
import type { Config } from '../config'
import { sha256 } from '../modules/record/record.append'

/** Where files lie: under their content's address, so that a key can never come to mean other bytes. */
export interface FileStore {
  /** Stores the bytes once; returns their SHA-256 and key. */
  put(bytes: Buffer): Promise<{ sha256: string; key: string }>
  /** The bytes under a key; throws where the store does not answer or the bytes do not match their address. */
  get(key: string): Promise<Buffer>
  check(): Promise<void>
}

const keyOf = (hash: string): string => `files/${hash.slice(0, 2)}/${hash}`

/** Files in S3 or whatever speaks its protocol. */
export function openFileStore(config: Config['s3']): FileStore {
  const client = new S3Client({
    endpoint: config.endpoint,
    region: config.region,
    forcePathStyle: true,
    credentials: { accessKeyId: config.accessKeyId, secretAccessKey: config.secretAccessKey },
    // Otherwise streamed bodies are stored with their chunk framing by stores that do not know it.
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
    maxAttempts: 2,
  })
  const Bucket = config.bucket
  return {
    async put(bytes) {
      const hash = sha256(bytes)
      const key = keyOf(hash)
      const there = await client.send(new HeadObjectCommand({ Bucket, Key: key })).then(
        () => true,
        () => false,
      )
      if (!there)
        await client.send(
          new PutObjectCommand({ Bucket, Key: key, Body: bytes, ContentLength: bytes.length }),
        )
      return { sha256: hash, key }
    },
    async get(key) {
      const answer = await client.send(new GetObjectCommand({ Bucket, Key: key }))
      if (!answer.Body) throw new Error(`The object ${key} has no body.`)
      const bytes = Buffer.from(await answer.Body.transformToByteArray())
      if (keyOf(sha256(bytes)) !== key)
        throw new Error(`The object ${key} does not hold the bytes it is named for.`)
      return bytes
    },
    async check() {
      await client.send(new HeadBucketCommand({ Bucket }))
    },
  }
}

// The package brings no types; these are of the part that is used here.
declare module 's3rver' {
  interface Options {
    address: string
    port: number
    directory: string
    silent?: boolean
    configureBuckets?: { name: string; configs: string[] }[]
  }
  export default class S3rver {
    constructor(options: Options)
    run(): Promise<{ address: string; port: number }>
    close(): Promise<void>
  }
}

import type { NextFunction, Request, RequestHandler, Response } from 'express'
import multer from 'multer'
import { defineError, invalidInput } from '../errors'
import type { UploadedFile } from './route'

const tooLarge = defineError(
  'file-too-large',
  413,
  (megabytes: number) => `This file is larger than ${megabytes} MB. Send a smaller one, or split it.`,
)

/** Takes one file of a form into memory, up to a limit; its structured fields become the body. */
export function acceptFile(maximumBytes: number): RequestHandler {
  const upload = multer({
    storage: multer.memoryStorage(),
    limits: { fileSize: maximumBytes, files: 1, fields: 40, fieldSize: 4_000_000, parts: 60 },
    defParamCharset: 'utf8',
  }).single('file')
  return (request: Request, response: Response, next: NextFunction) =>
    upload(request, response, (error: unknown) => {
      if (error instanceof multer.MulterError) {
        if (error.code === 'LIMIT_FILE_SIZE') return next(tooLarge(Math.round(maximumBytes / 1_000_000)))
        return next(
          invalidInput([{ path: error.field ? `body.${error.field}` : 'body', message: error.message }]),
        )
      }
      if (error)
        return next(
          invalidInput([
            { path: 'body', message: 'The upload was cut off or is not a form. Choose the file again.' },
          ]),
        )
      // Structured fields travel as JSON in the field `data`.
      const body = request.body as { data?: string } | undefined
      if (typeof body?.data === 'string') {
        try {
          request.body = JSON.parse(body.data) as unknown
        } catch {
          return next(invalidInput([{ path: 'body.data', message: 'This is not JSON.' }]))
        }
      }
      next()
    })
}

/** The uploaded file of a request, under a name that is safe to show. */
export const uploaded = (file: Express.Multer.File): UploadedFile => ({
  name: ownName(file.originalname),
  bytes: file.buffer,
})

/** A file's name without any path, control characters or quotes; never used as a path. */
const ownName = (name: string): string =>
  (name.split(/[\\/]/).pop() ?? '')
    // eslint-disable-next-line no-control-regex -- the control characters are what is removed
    .replace(/[\u0000-\u001f\u007f"\u2028\u2029\ud800-\udfff]/g, '')
    .slice(0, 200) || 'file'

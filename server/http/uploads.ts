import type { RequestHandler } from 'express'
import multer, { MulterError } from 'multer'
import { HttpError, type FieldFault } from './problem'

const refuse = (status: number, slug: string, title: string, fault: FieldFault) =>
  new HttpError(status, slug, title, fault.message, { errors: [fault] })

function wordsFor(error: MulterError, field: string, bytes: number): HttpError {
  const megabytes = Math.floor(bytes / (1024 * 1024))
  if (error.code === 'LIMIT_FILE_SIZE')
    return refuse(413, 'too-large', 'Too large', {
      field,
      message: `The picture is over ${megabytes} MB. Send a smaller one.`,
    })
  return refuse(400, 'bad-input', 'Cannot be taken', {
    field,
    message: `Send one picture in the field ${field}, and nothing else.`,
  })
}

/** One file of a multipart request, held in memory up to `bytes`; its faults as problem details. */
export function oneFile(field: string, bytes: number): RequestHandler {
  const upload = multer({
    storage: multer.memoryStorage(),
    limits: { fileSize: bytes, files: 1, fields: 10, fieldSize: 2000, parts: 12 },
  }).single(field)
  return (req, res, next) => {
    if (!req.is('multipart/form-data'))
      throw refuse(400, 'bad-input', 'Cannot be taken', {
        field,
        message: `Send multipart/form-data with the picture in ${field}.`,
      })
    upload(req, res, (error: unknown) => {
      if (error instanceof MulterError) return next(wordsFor(error, field, bytes))
      if (error)
        return next(
          refuse(400, 'bad-input', 'Cannot be taken', {
            field,
            message: 'The picture did not arrive whole. Send it again.',
          }),
        )
      if (!req.file?.size)
        return next(
          refuse(400, 'bad-input', 'Cannot be taken', { field, message: 'There is no picture. Add one.' }),
        )
      next()
    })
  }
}

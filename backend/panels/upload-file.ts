import type { Request, RequestHandler } from 'express';
import multer, { MulterError } from 'multer';
import { AppError, Invalid } from '../errors/app-error';

const mostBytes = 40 * 1024 * 1024;

const receive = multer({
  storage: multer.memoryStorage(),
  limits: { fileSize: mostBytes, files: 1, fields: 0, parts: 2 },
  defParamCharset: 'utf8',
}).single('file');

/** Takes one file named `file`, of at most 40 MB, into memory. */
export const uploadFile: RequestHandler = (req, res, next) => {
  if (Number(req.get('content-length') ?? 0) > mostBytes + 10_000) throw tooLarge();
  receive(req, res, (error: unknown) => {
    if (error instanceof MulterError)
      next(error.code === 'LIMIT_FILE_SIZE' ? tooLarge() : new Invalid(error.message));
    else if (error instanceof Error && !('code' in error))
      next(new Invalid('The upload was cut off or is no upload. Choose the file again.'));
    else next(error);
  });
};

/** @throws {Invalid} without a file; {AppError} `type-not-allowed` for what is no CSV by name. */
export function uploadedFile(req: Request): { readonly name: string; readonly bytes: Buffer } {
  const file = req.file;
  if (file === undefined) throw new Invalid('Expected a file in the field "file"; found none.');
  const name = file.originalname.replace(/[\r\n\0]/g, ' ').slice(0, 255);
  if (!/\.(csv|txt|tsv)$/i.test(name))
    throw new AppError(
      'type-not-allowed',
      415,
      `Expected a .csv file; found “${name}”. Save the sheet as CSV and choose that file.`,
    );
  return { name, bytes: file.buffer };
}

function tooLarge(): AppError {
  return new AppError('too-large', 413, 'The file is larger than 40 MB.');
}

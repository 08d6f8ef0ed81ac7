import type { Request, RequestHandler } from 'express';
import multer, { MulterError } from 'multer';
import { AppError, Invalid } from '../errors/app-error';
import { beginningOf } from '../files/beginning-of';

const megabyte = 1024 * 1024;

/** Kinds of file by the name's ending, and the largest of each that is taken. */
const kinds = [
  { ending: /\.(csv|txt|tsv)$/i, megabytes: 40 },
  { ending: /\.xlsx$/i, megabytes: 10 },
] as const;

const mostMegabytes = Math.max(...kinds.map(({ megabytes }) => megabytes));
/** What a form around one file may take besides the file. */
const formBytes = 10_000;

const receive = multer({
  storage: multer.memoryStorage(),
  limits: { fileSize: mostMegabytes * megabyte, files: 1, fields: 0, parts: 2 },
  defParamCharset: 'utf8',
  fileFilter: (req, file, callback) => {
    const refusal = refusalOf(file.originalname, declaredBytes(req) - formBytes);
    if (refusal === undefined) callback(null, true);
    else callback(refusal);
  },
}).single('file');

/** Takes one file named `file` into memory, refused before it is read where its name or declared length tells. */
export const uploadFile: RequestHandler = (req, res, next) => {
  if (declaredBytes(req) > mostMegabytes * megabyte + formBytes) throw tooLarge(mostMegabytes);
  receive(req, res, (error: unknown) => {
    if (error instanceof AppError) next(error);
    else if (error instanceof MulterError)
      next(error.code === 'LIMIT_FILE_SIZE' ? tooLarge(mostMegabytes) : new Invalid(error.message));
    else if (error instanceof Error && !('code' in error))
      next(new Invalid('The upload was cut off or is no upload. Choose the file again.'));
    else next(error);
  });
};

/** @throws {Invalid} without a file; {AppError} `type-not-allowed` or `too-large`. */
export function uploadedFile(req: Request): { readonly name: string; readonly bytes: Buffer } {
  const file = req.file;
  if (file === undefined) throw new Invalid('Expected a file in the field "file"; found none.');
  // A length that was not declared is known only now.
  const refusal = refusalOf(file.originalname, file.buffer.length);
  if (refusal !== undefined) throw refusal;
  return { name: storedName(file.originalname), bytes: file.buffer };
}

function refusalOf(originalName: string, bytes: number): AppError | undefined {
  const name = storedName(originalName);
  const kind = kinds.find(({ ending }) => ending.test(name));
  if (kind === undefined)
    return new AppError(
      'type-not-allowed',
      415,
      `Expected a .csv or .xlsx file; found “${name}”. Save the sheet as one of these and choose that file.`,
    );
  return bytes > kind.megabytes * megabyte ? tooLarge(kind.megabytes) : undefined;
}

/** The name as data: a line break in it would reach headers and logs. */
function storedName(name: string): string {
  return beginningOf(name.replace(/[\r\n\0]/g, ' '), 255);
}

function declaredBytes(req: { headers: Request['headers'] }): number {
  return Number(req.headers['content-length'] ?? 0);
}

function tooLarge(megabytes: number): AppError {
  return new AppError('too-large', 413, `The file is larger than ${megabytes} MB.`);
}

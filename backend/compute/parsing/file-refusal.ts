/** Why a file is not read, in the words of the upload rules; `reading-invalid` is the choice of sheet or header. */
export type FileRefusalCode =
  | 'type_not_allowed'
  | 'zip_limit'
  | 'sheet_limit'
  | 'xlsx_active_content'
  | 'csv_invalid'
  | 'reading_invalid';

/** A file that is refused: a code and a sentence for a person. */
export class FileRefusal extends Error {
  override readonly name = 'FileRefusal';

  constructor(
    readonly code: FileRefusalCode,
    message: string,
  ) {
    super(message);
  }
}

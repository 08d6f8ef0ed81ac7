import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { resolve } from 'node:path';
import { readTable } from '../../backend/compute/parsing/read-table';
import type { Table } from '../../backend/compute/parsing/table';
import { toPanelColumns } from '../../backend/compute/parsing/to-panel-columns';
import { evidenceOf, openFit } from '../../backend/stats';
import { type FitArguments, readArguments } from './fit-arguments';
import { cellsProblem, FitProblem } from './fit-problem';
import { type DroppedCell, fitReply } from './fit-reply';

/**
 * Fits a panel file as the server would, without a database.
 *
 * @param args  the command line behind the command's name.
 * @param folder  what a relative path of the panel starts from.
 * @returns the object to print.
 * @throws {FitProblem | StatsError | TableError} for bad input.
 */
export async function runFit(
  args: readonly string[],
  folder: string = process.cwd(),
): Promise<unknown> {
  const request = readArguments(args);
  const table = await readFile(resolve(folder, request.panel));
  const { data, problems, leftOut } = toPanelColumns(table, request);
  if (problems.length > 0) throw cellsProblem(problems);
  const { specification, own, members } = request;
  const open = openFit({ data, specification, own, members }, { sha256 });
  const dropped = leftOut.filter(({ row }) => isInSample(table, row, request));
  return fitReply(
    open.result,
    dropped.map(({ row, column }): DroppedCell => ({ row, column, reason: 'missing' })),
    request.isEvidenceAsked ? evidenceOf(open) : undefined,
  );
}

async function readFile(path: string): Promise<Table> {
  try {
    return await readTable(createReadStream(path));
  } catch (error) {
    const { code } = error as { code?: string };
    const fault = code === undefined ? undefined : fileFaults.get(code);
    if (fault === undefined) throw error;
    const detail = `expected a file at ${path}; ${fault}`;
    throw new FitProblem('unreadable-file', 'The file cannot be read', detail);
  }
}

const fileFaults = new Map([
  ['ENOENT', 'there is none'],
  ['EISDIR', 'it is a folder'],
  ['EACCES', 'it may not be read'],
  ['ENOTDIR', 'there is none'],
]);

/** A row without a year belongs to a company; it concerns the fit only where that company does. */
function isInSample(table: Table, line: number, request: FitArguments): boolean {
  if (request.members === undefined) return true;
  const cells = table.rows[table.lines.indexOf(line)];
  const company = cells[table.header.indexOf(request.company)];
  return company === request.own || request.members.includes(company);
}

function sha256(text: string): string {
  return createHash('sha256').update(text, 'utf8').digest('hex');
}

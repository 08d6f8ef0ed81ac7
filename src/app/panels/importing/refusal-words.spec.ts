import { problemType } from '@contract';
import { ApiProblem } from '../../api/api-problem';
import { refusalWords, refusedHere } from './refusal-words';

function refusal(extra: Readonly<Record<string, string>>): ApiProblem {
  return new ApiProblem('unreadable-file', {
    type: problemType('unreadable-file'),
    title: 'The file cannot be read',
    status: 422,
    ...extra,
  });
}

describe('words of a refused file', () => {
  it('say what to do for each code', () => {
    const codes = [
      'type_not_allowed',
      'too_large',
      'zip_limit',
      'sheet_limit',
      'csv_invalid',
      'parse_timeout',
      'parse_memory',
      'quota',
    ];
    const words = codes.map((code) => refusalWords(refusal({ code })).whatToDo ?? '');
    expect(words.every((text) => text.length > 20)).toBeTrue();
    expect(new Set(words).size).toBe(codes.length);
  });

  it('are sentences, and say nothing twice of a workbook whose answer says what to save', () => {
    const detail = 'expected a workbook of plain cells; found macros. Save a copy and choose that';
    const words = refusalWords(refusal({ code: 'xlsx_active_content', detail }));
    expect(words.detail).toBe(
      'Expected a workbook of plain cells; found macros. Save a copy and choose that.',
    );
    expect(words.whatToDo).toBeUndefined();
  });

  it('leave a problem of another kind as it is', () => {
    expect(refusalWords(refusal({})).whatToDo).toBeUndefined();
    expect(refusalWords(refusal({ code: 'toString' })).title).toBe('The file cannot be read');
  });

  it('stop a file here that the server would not take', () => {
    expect(refusedHere({ name: 'peers.XLSX', size: 10 * 1024 ** 2 })).toBeNull();
    expect(refusedHere({ name: 'peers.csv', size: 40 * 1024 ** 2 })).toBeNull();
    expect(refusedHere({ name: 'peers.xlsx', size: 11 * 1024 ** 2 })?.detail).toContain('11.0 MB');
    expect(refusedHere({ name: 'peers.xls', size: 1 })?.detail).toContain('found peers.xls');
  });
});

import Papa from 'papaparse';

/**
 * A cell that begins like a formula gets an apostrophe in front, so that no spreadsheet runs it; one that begins with
 * apostrophes before such a sign gets one more, so that reading takes back exactly what writing added.
 */
function guard(cell: string): string {
  return /^'*[=+\-@\t\r]/.test(cell) ? `'${cell}` : cell;
}

function unguard(cell: string): string {
  return /^'+[=+\-@\t\r]/.test(cell) ? cell.slice(1) : cell;
}

/** A CSV file (RFC 4180, CRLF, UTF-8 with a byte order mark for spreadsheets) of these rows under this head. */
export function writeCsv(head: readonly string[], rows: readonly (readonly string[])[]): string {
  return `\uFEFF${Papa.unparse({ fields: [...head], data: rows.map((row) => row.map(guard)) }, { newline: '\r\n' })}\r\n`;
}

/** Cells of a CSV file by row, head first; the delimiter is guessed. Lines without any text are left out. */
export function readCsv(text: string): string[][] {
  const { data } = Papa.parse<string[]>(text.replace(/^\uFEFF/, ''), { skipEmptyLines: 'greedy' });
  return data.map((row) => row.map((cell) => unguard(cell.trim())));
}

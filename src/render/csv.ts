/**
 * A table as CSV (RFC 4180) for spreadsheets and programs.
 *
 * In UTF-8 with a byte order mark, because spreadsheet programs otherwise take µ and ± for other signs; readers of ours
 * accept it with and without. Lines end in CRLF. A cell that a spreadsheet would take for a formula (it begins with =, +,
 * −, @ or a control character, and is no plain number) gets an apostrophe before it and is shown as text.
 */
export function csvText(rows: readonly (readonly string[])[]): string {
  return `\ufeff${rows.map((row) => `${row.map(csvCell).join(',')}\r\n`).join('')}`;
}

const PLAIN_NUMBER = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/;

function csvCell(text: string): string {
  // Line ends within a cell would survive the quotes, and many programs get them wrong.
  const oneLine = text.replace(/\s*[\r\n]+\s*/g, ' ');
  const safe =
    /^\s*[=+\-@\t\u2212\uff1d\uff0b\uff0d\uff20]/.test(oneLine) && !PLAIN_NUMBER.test(oneLine)
      ? `'${oneLine}`
      : oneLine;
  return /[",']|^\s|\s$/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

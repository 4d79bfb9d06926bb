/** Tables as CSV that a spreadsheet opens without running anything. */

const STARTS_A_FORMULA = /^[=+\-@\t\r]/;
const IS_A_NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;

/** A cell that a spreadsheet would run as a formula is kept as text; negative numbers stay numbers. */
export function csvCell(value) {
  if (value === null || value === undefined) return '';
  let text = String(value);
  if (STARTS_A_FORMULA.test(text) && !IS_A_NUMBER.test(text)) text = `'${text}`;
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

/**
 * @param {Array<string>} headings
 * @param {Array<Array<string|number|null>>} rows full, unrounded values
 */
export function csv(headings, rows) {
  // The mark at the start tells spreadsheets that this is UTF-8.
  return `\ufeff${[headings, ...rows].map((row) => row.map(csvCell).join(',')).join('\r\n')}\r\n`;
}

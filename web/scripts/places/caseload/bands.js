/** A projected number in a table: what is expected, and where 80 and 95 of 100 runs fell. */

/**
 * @param {import('../../app.js').App} app
 * @param {string} heading
 * @param {(row: any) => {value: number, p80: [number, number], p95: [number, number]}} pick
 * @param {(number: number) => string} [write]
 */
export function bandColumns(app, heading, pick, write = app.words.count) {
  const { say } = app.words;
  const range = ([lower, upper]) => (lower === upper ? '–' : say('from-to', { lower: write(lower), upper: write(upper) }));
  return [
    { heading, show: (row) => write(pick(row).value), full: (row) => pick(row).value },
    { heading: say('band-80'), show: (row) => range(pick(row).p80), full: (row) => pick(row).p80.join(' ') },
    { heading: say('band-95'), show: (row) => range(pick(row).p95), full: (row) => pick(row).p95.join(' ') },
  ];
}

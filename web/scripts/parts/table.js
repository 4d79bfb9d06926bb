/** Ruled tables with a caption and scoped headings, each to be saved as CSV in full precision. */
import { button } from './choices.js';
import { csv } from './csv.js';
import { h } from './element.js';
import { save } from './save.js';

/**
 * @template Row
 * @typedef {object} Column
 * @property {string} heading
 * @property {(row: Row) => string|Node} show rounded, for people
 * @property {(row: Row) => string|number|null} [full] unrounded, for the CSV; left out where `show` is text
 * @property {boolean} [text] set left instead of right
 */

/**
 * The first column names the row.
 * @template Row
 * @param {import('../app.js').App} app
 * @param {{ name: string, caption: string, columns: Column<Row>[], rows: Row[], note?: string, saveable?: boolean, rowClass?: (row: Row) => string|null }} table
 *   `name` is the file name without its ending
 */
export function table(app, { name, caption, columns, rows, note, saveable = true, rowClass }) {
  const { say } = app.words;
  const kind = (column) => (column.text ? 'text' : 'number');
  const body = rows.map((row) =>
    h('tr', { class: rowClass?.(row) },
      columns.map((column, position) =>
        position === 0
          ? h('th', { scope: 'row', class: kind(column) }, column.show(row))
          : h('td', { class: kind(column) }, column.show(row)))));
  const saveButton = saveable && button(say('save-table'), () => save(`${name}.csv`, 'text/csv', tableAsCsv(columns, rows)), {
    class: 'quiet', 'data-screen-only': true,
  });
  return h('div', { class: 'table' },
    h('div', { class: 'scroll', tabindex: 0, role: 'region', 'aria-label': caption },
      h('table', {},
        h('caption', {}, caption),
        h('thead', {}, h('tr', {}, columns.map((column) => h('th', { scope: 'col', class: kind(column) }, column.heading)))),
        h('tbody', {}, body))),
    note && h('p', { class: 'note' }, note),
    saveButton);
}

/** @param {Column<any>[]} columns */
export function tableAsCsv(columns, rows) {
  const cell = (column, row) => {
    if (column.full) return column.full(row);
    const shown = column.show(row);
    return shown instanceof Node ? shown.textContent : shown;
  };
  return csv(columns.map((column) => column.heading), rows.map((row) => columns.map((column) => cell(column, row))));
}

/**
 * The column that names the group, where there are groups.
 * @param {import('../app.js').App} app
 * @param {Array<{level: string|null}>} rows
 * @param {(level: string|null) => string} name
 * @returns {Column<any>[]}
 */
export function groupColumn(app, rows, name) {
  if (rows.every((row) => row.level === null)) return [];
  return [{ heading: app.words.say('group'), show: (row) => name(row.level), text: true }];
}

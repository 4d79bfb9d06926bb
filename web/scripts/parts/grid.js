/** A small table to type into: rows can be added, removed and pasted from a spreadsheet. */
import { button } from './choices.js';
import { h } from './element.js';

/**
 * @typedef {object} GridColumn
 * @property {string} name of the field in a row
 * @property {string} heading
 * @property {'text'|'number'|'choice'} kind
 * @property {Array<{value: string, label: string}>} [options] of a choice
 * @property {number} [least]
 * @property {number|'any'} [step]
 */

/**
 * @param {import('../app.js').App} app
 * @param {{ id: string, caption: string, columns: GridColumn[], rows: Array<Record<string, any>>, current: () => Array<Record<string, any>>, blank: () => Record<string, any>,
 *   faults?: (row: Record<string, any>) => Record<string, string>, onchange: (rows: Array<Record<string, any>>) => void }} grid
 *   `rows` are drawn, `current` gives them as they are when something is changed;
 *   `faults` names what is wrong with the fields of a row, in words
 */
export function typedGrid(app, { id, caption, columns, rows, current, blank, faults = () => ({}), onchange }) {
  const { say } = app.words;
  const replace = (position, patch) => onchange(current().map((row, i) => (i === position ? { ...row, ...patch } : row)));

  function cell(row, position, column) {
    const fault = faults(row)[column.name];
    const field = `${id}-${position}-${column.name}`;
    const naming = {
      id: field, 'aria-label': say('grid-cell', { column: column.heading, row: position + 1 }),
      'aria-invalid': fault ? 'true' : null, 'aria-describedby': fault ? `${field}-fault` : null,
      onchange: (event) => replace(position, { [column.name]: read(event.target.value, column) }),
    };
    const input = column.kind === 'choice' ? h('select', naming, column.options.map(({ value, label }) =>
      h('option', { value, selected: value === row[column.name] }, label))) : h('input', {
      ...naming, type: column.kind, value: row[column.name] ?? '', min: column.least, step: column.step ?? (column.kind === 'number' ? 'any' : null),
      inputmode: column.kind === 'number' ? 'decimal' : null, autocomplete: 'off',
      onpaste: (event) => paste(event, position, column),
    });
    return h('td', {}, input, fault && h('p', { class: 'fault', id: `${field}-fault` }, fault));
  }

  /** Several cells at once fill the grid from here on. */
  function paste(event, position, column) {
    const lines = event.clipboardData.getData('text').replace(/\r/g, '').replace(/\n$/, '').split('\n').map((line) => line.split('\t'));
    if (lines.length === 1 && lines[0].length === 1) return;
    event.preventDefault();
    const from = columns.indexOf(column);
    const filled = [...current()];
    lines.forEach((cells, i) => {
      const row = { ...(filled[position + i] ?? blank()) };
      cells.forEach((text, j) => {
        const target = columns[from + j];
        if (target) row[target.name] = read(text.trim(), target);
      });
      filled[position + i] = row;
    });
    onchange(filled);
  }

  const remove = (position) => button(say('grid-remove'), () => onchange(current().filter((_, i) => i !== position)), {
    class: 'quiet', id: `${id}-${position}-remove`, 'aria-label': say('grid-remove-row', { row: position + 1 }),
  });

  return h('div', { class: 'table typed', 'data-screen-only': true },
    h('div', { class: 'scroll', tabindex: 0, role: 'region', 'aria-label': caption },
      h('table', {},
        h('caption', {}, caption),
        h('thead', {}, h('tr', {}, columns.map(({ heading }) => h('th', { scope: 'col', class: 'text' }, heading)), h('td', {}))),
        h('tbody', {}, rows.map((row, position) => h('tr', {}, columns.map((column) => cell(row, position, column)), h('td', {}, remove(position))))))),
    button(say('grid-add'), () => onchange([...current(), blank()]), { class: 'plain', id: `${id}-add` }),
    h('p', { class: 'hint' }, say('grid-paste-hint')));
}

/** What was typed or pasted: numbers may have a decimal comma or spaces between thousands. */
function read(text, column) {
  if (column.kind !== 'number') return text;
  const plain = text.replace(/[\s\u00a0\u202f]/g, '').replace(',', '.');
  const number = Number(plain);
  return plain === '' || Number.isNaN(number) ? null : number;
}

/** Faults of number fields: negative, or not whole where only whole numbers count. */
export function numberFaults(app, row, names, { whole = true } = {}) {
  const { say } = app.words;
  /** @type {Record<string, string>} */
  const found = {};
  for (const name of names) {
    const value = row[name];
    if (value === null || value === undefined) continue;
    if (value < 0) found[name] = say('fault-negative');
    else if (whole && !Number.isInteger(value)) found[name] = say('fault-not-whole');
  }
  return found;
}

/** Whether every named field of a row holds a number. */
export function complete(row, names) {
  return names.every((name) => typeof row[name] === 'number');
}

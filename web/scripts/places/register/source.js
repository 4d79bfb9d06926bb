/** What the file is and how its first rows look. */
import { choiceRow, numberField, selectOne } from '../../parts/choices.js';
import { h, written } from '../../parts/element.js';
import { live } from '../../parts/live.js';
import { cautionList } from '../../parts/said.js';
import { table } from '../../parts/table.js';

/** @param {import('../../app.js').App} app @param {ReturnType<typeof import('./reader.js').makeReader>} reader */
export function sourceBlock(app, reader) {
  return live(app, (state) => [state.source?.fingerprint, state.source?.sheet, state.source?.header_line], (state) => {
    const { say } = app.words;
    const { source } = state;
    return [h('section', { 'aria-labelledby': 'source-heading' },
      h('h2', { id: 'source-heading' }, say('source-title')),
      h('p', {}, written(source.name), ' – ', say(`source-${source.form}`, {
        rows: source.rows, columns: source.columns.length, encoding: source.encoding ?? '',
        delimiter: source.delimiter ? say(`delimiter-${DELIMITERS[source.delimiter]}`) : '',
      })),
      choiceRow(
        source.sheets.length > 1 ? selectOne({
          id: 'source-sheet', label: say('source-sheet'), value: source.sheet,
          options: source.sheets.map((sheet) => ({ value: sheet, label: sheet })),
          onchange: (sheet) => reader.again({ sheet }),
        }) : null,
        numberField({
          id: 'source-header', label: say('source-header'), hint: say('source-header-hint'), value: source.header_line,
          least: 1, step: 1, onchange: (line) => line && reader.again({ sheet: source.sheet, header_line: line }),
        })),
      preview(app, source),
      cautionList(app, source.cautions))];
  });
}

const DELIMITERS = { ',': 'comma', ';': 'semicolon', '\t': 'tab', '|': 'bar' };

function preview(app, { columns, preview: rows }) {
  const { say, count } = app.words;
  return table(app, {
    name: 'first-rows', caption: say('preview-caption'), rows, saveable: false,
    columns: [
      { heading: say('line'), show: (row) => count(row.line) },
      ...columns.map((column, i) => ({ heading: column.heading, show: (row) => written(row.cells[i] ?? ''), text: true })),
    ],
  });
}

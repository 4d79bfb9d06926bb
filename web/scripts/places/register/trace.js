/** Who is overdue for a visit, the longest unseen first; only the columns that are picked leave the engine. */
import { answerBlock } from '../../parts/answer.js';
import { button, choiceRow, numberField, tickSeveral } from '../../parts/choices.js';
import { csv } from '../../parts/csv.js';
import { h, written } from '../../parts/element.js';
import { live } from '../../parts/live.js';
import { cautionList } from '../../parts/said.js';
import { save } from '../../parts/save.js';
import { table } from '../../parts/table.js';
import { requestOf } from './reader.js';

const SHOWN = 20;

/** @param {import('../../app.js').App} app */
export function traceBlock(app) {
  return answerBlock(app, {
    id: 'trace',
    title: 'trace-title',
    empty: 'findings-empty',
    choices: choices(app),
    ask: ({ cohort, trace }) => cohort && {
      task: 'register.trace_list',
      request: { ...requestOf(cohort.reading), overdue_months: trace.months, with_lost: trace.withLost, columns: trace.columns },
    },
    draw: (answer) => [...said(app, answer), ...list(app, answer)],
    // Who is on the list never reaches the report: reports are handed on.
    paper: (answer) => said(app, answer),
  });
}

function choices(app) {
  return live(app, ({ cohort, source, trace }) => [Boolean(cohort), source?.fingerprint, source?.sheet, source?.header_line, trace], ({ cohort, source, trace }) => {
    if (!cohort) return [];
    const { say } = app.words;
    return [
      choiceRow(
        numberField({
          id: 'trace-months', label: say('trace-months'), value: trace.months, least: 0, greatest: 120, step: 1,
          onchange: (months) => months >= 0 && months <= 120 && months !== null && app.store.amend('trace', { months }),
        }),
        h('div', { class: 'choice' }, h('label', { class: 'tick' },
          h('input', { type: 'checkbox', id: 'trace-lost', checked: trace.withLost, onchange: (event) => app.store.amend('trace', { withLost: event.target.checked }) }),
          ' ', say('trace-with-lost')))),
      h('details', { class: 'behind', open: trace.columns.length > 0 }, h('summary', {}, say('trace-columns')),
        tickSeveral({
          id: 'trace-column', legend: say('trace-columns-legend'), hint: say('trace-columns-hint'), values: trace.columns,
          options: source.columns.map(({ id, heading, position }) => ({ value: id, label: written(heading || say('column-unnamed', { position: position + 1 })) })),
          onchange: (columns) => app.store.amend('trace', { columns }),
        })),
    ];
  });
}

function said(app, answer) {
  const { say } = app.words;
  return [
    h('p', { class: 'sentence' }, say('trace-sentence', { n: answer.n, months: answer.months })),
    answer.unjudged ? h('p', {}, say('trace-unjudged', { n: answer.unjudged })) : null,
    h('p', { class: 'method' }, say('trace-method')),
  ];
}

function list(app, answer) {
  const { say, count, day } = app.words;
  if (!answer.n) return [];
  const columns = [
    { heading: say('line'), show: (row) => count(row.line), full: (row) => row.line },
    { heading: say('trace-days'), show: (row) => count(row.days), full: (row) => row.days },
    { heading: say('trace-last'), show: (row) => day(row.last_contact), full: (row) => row.last_contact, text: true },
    { heading: say('how-it-ended'), show: (row) => say(`meaning-${row.outcome}`), text: true },
    ...answer.columns.map(({ heading, id }, i) => ({ heading: heading || id, show: (row) => written(row.cells[i]), full: (row) => row.cells[i], text: true })),
  ];
  return [
    cautionList(app, answer.cautions),
    h('p', { 'data-screen-only': true }, button(say('trace-save', { n: answer.rows.length }), () => save('trace-list.csv', 'text/csv', csv(
      columns.map(({ heading }) => heading),
      answer.rows.map((row) => columns.map((column) => (column.full ? column.full(row) : column.show(row)))),
    )), { id: 'trace-save', class: 'plain' })),
    table(app, {
      name: 'trace-list', caption: say('trace-caption'), rows: answer.rows.slice(0, SHOWN), saveable: false, columns,
      note: answer.rows.length > SHOWN ? say('trace-first', { shown: SHOWN, n: answer.n }) : null,
    }),
  ];
}

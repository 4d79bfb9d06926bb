/** A life table from typed totals. */
import { answerBlock } from '../../parts/answer.js';
import { numberField } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { complete, numberFaults, typedGrid } from '../../parts/grid.js';
import { lifeTable } from '../../parts/life_table.js';
import { live } from '../../parts/live.js';
import { cautionList } from '../../parts/said.js';
import { DAYS_PER_YEAR } from '../../units.js';
import { exampleButtons } from './example.js';

const COUNTS = ['lost', 'withdrawn', 'events'];
const FIELDS = ['width_years', ...COUNTS];
const blank = () => ({ width_years: 1, lost: 0, withdrawn: 0, events: null });
const EMPTY = { entering: null, rows: [blank(), blank(), blank()] };
/** Invented. */
const EXAMPLE = {
  entering: 240,
  rows: [
    { width_years: 1, lost: 14, withdrawn: 21, events: 18 },
    { width_years: 1, lost: 9, withdrawn: 24, events: 9 },
    { width_years: 1, lost: 6, withdrawn: 27, events: 5 },
    { width_years: 2, lost: 5, withdrawn: 38, events: 6 },
  ],
};

/** @param {import('../../app.js').App} app */
export function lifeTablePart(app) {
  return answerBlock(app, {
    id: 'counts-life-table',
    title: 'counts-life-table-title',
    choices: form(app),
    empty: 'counts-life-table-empty',
    ask: ({ counts }) => request(counts.lifeTable),
    draw: (answer) => draw(app, answer),
  });
}

function request({ entering, rows }) {
  const filled = rows.slice(0, rows.findLastIndex((row) => complete(row, FIELDS)) + 1);
  // An interval left open between others would shift all that follow: nothing is answered until it is filled.
  if (!filled.every((row) => complete(row, FIELDS))) return null;
  if (typeof entering !== 'number' || !filled.length) return null;
  return { task: 'counts.life_table', request: { entering, rows: filled.map((row) => Object.fromEntries(FIELDS.map((name) => [name, row[name]]))) } };
}

/** What has been typed so far, with some empty rows to begin with. */
function typed({ lifeTable: { entering, rows } }) {
  return { entering, rows: rows.length ? rows : EMPTY.rows };
}

function form(app) {
  return live(app, (state) => state.counts.lifeTable, ({ counts }) => {
    const { say } = app.words;
    const { entering, rows } = typed(counts);
    const change = (patch) => app.store.amend('counts', { lifeTable: { ...typed(app.store.state.counts), ...patch } });
    return [
      h('p', {}, say('counts-life-table-lead')),
      numberField({ id: 'counts-entering', label: say('counts-entering'), value: entering, least: 1, step: 1, onchange: (value) => change({ entering: value }) }),
      typedGrid(app, {
        id: 'counts-intervals', caption: say('counts-intervals'), rows, current: () => typed(app.store.state.counts).rows, blank,
        columns: [
          { name: 'width_years', heading: say('width-years'), kind: 'number', least: 0 },
          { name: 'lost', heading: say('lost'), kind: 'number', least: 0, step: 1 },
          { name: 'withdrawn', heading: say('withdrawn-typed'), kind: 'number', least: 0, step: 1 },
          { name: 'events', heading: say('events'), kind: 'number', least: 0, step: 1 },
        ],
        faults: (row) => ({
          ...numberFaults(app, row, COUNTS),
          ...(typeof row.width_years === 'number' && row.width_years <= 0 ? { width_years: say('fault-not-positive') } : {}),
        }),
        onchange: (changed) => change({ rows: changed }),
      }),
      exampleButtons(app, 'lifeTable', EXAMPLE, EMPTY),
    ];
  });
}

function draw(app, answer) {
  const { say, percent, decimal } = app.words;
  const last = answer.rows.at(-1);
  return [
    h('p', { class: 'sentence' }, say('counts-life-table-sentence', {
      survival: percent(last.survival.value), years: decimal(last.to_days / DAYS_PER_YEAR, last.to_days % DAYS_PER_YEAR === 0 ? 0 : 1),
      interval: say('from-to', { lower: percent(last.survival.lower), upper: percent(last.survival.upper) }),
    })),
    lifeTable(app, { name: 'life-table-from-counts', caption: say('life-table-caption'), rows: answer.rows, step: 'year' }),
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, say('life-table-method')),
  ];
}

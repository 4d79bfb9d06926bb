/** Incidence and prevalence: how many under care, how many come, how many leave. */
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, numberField } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { complete, numberFaults, typedGrid } from '../../parts/grid.js';
import { live } from '../../parts/live.js';
import { cautionList } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { exampleButtons } from './example.js';

const blank = () => ({ label: '', per_year: null });
const EMPTY = { prevalent: null, new_per_year: null, leaving: [], years: 5, population: null };

/** @param {import('../../app.js').App} app */
export function balancePart(app) {
  return answerBlock(app, {
    id: 'counts-balance',
    title: 'counts-balance-title',
    choices: form(app),
    empty: 'counts-balance-empty',
    ask: ({ counts }) => request(counts.balance),
    draw: (answer) => draw(app, answer),
  });
}

function request({ prevalent, new_per_year, leaving, years, population }) {
  const filled = leaving.filter((row) => complete(row, ['per_year']));
  if (prevalent === null || new_per_year === null || !filled.length) return null;
  return { task: 'counts.balance', request: { prevalent, new_per_year, leaving: filled, years, population } };
}

function example(say) {
  return {
    prevalent: 480, new_per_year: 95, years: 5, population: 310000,
    leaving: ['died', 'lost', 'moved_away'].map((way, i) => ({ label: say(`balance-example-${way}`), per_year: [22, 31, 12][i] })),
  };
}

function typed({ leaving }) {
  return leaving.length ? leaving : [blank(), blank()];
}

function form(app) {
  return live(app, (state) => state.counts.balance, ({ counts: { balance } }) => {
    const { say } = app.words;
    const change = (patch) => app.store.amend('counts', { balance: { ...app.store.state.counts.balance, ...patch } });
    const field = (name, options = {}) => numberField({
      id: `balance-${name}`, label: say(`balance-${name}`), value: balance[name], least: 0,
      onchange: (value) => change({ [name]: value }), ...options,
    });
    return [
      h('p', {}, say('counts-balance-lead')),
      choiceRow(field('prevalent', { step: 1 }), field('new_per_year'), field('population', { hint: say('balance-population-hint') }),
        field('years', { least: 1, greatest: 30, step: 1, onchange: (years) => years >= 1 && years <= 30 && change({ years }) })),
      typedGrid(app, {
        id: 'balance-leaving', caption: say('balance-leaving'), rows: typed(balance), current: () => typed(app.store.state.counts.balance), blank,
        columns: [
          { name: 'label', heading: say('way-of-leaving'), kind: 'text' },
          { name: 'per_year', heading: say('balance-per-year'), kind: 'number', least: 0 },
        ],
        faults: (row) => numberFaults(app, row, ['per_year'], { whole: false }),
        onchange: (leaving) => change({ leaving }),
      }),
      exampleButtons(app, 'balance', example(say), EMPTY),
    ];
  });
}

function draw(app, answer) {
  const { say, count, decimal } = app.words;
  const last = answer.path.at(-1);
  return [
    h('p', { class: 'sentence' }, say('balance-sentence', {
      now: count(answer.path[0].under_care), years: last.year, then: count(last.under_care), rate: count(last.under_care_at_constant_rate),
      turnover: decimal(answer.turnover, 1),
    })),
    answer.steady_state === null ? null : h('p', {}, say('balance-steady', { steady: count(answer.steady_state), duration: decimal(answer.mean_duration_years, 1) })),
    answer.prevalence_per_100000 === null ? null : h('p', {}, say('balance-population-sentence', {
      prevalence: decimal(answer.prevalence_per_100000, 1), incidence: decimal(answer.incidence_per_100000, 1),
    })),
    table(app, {
      name: 'balance', caption: say('balance-caption'), rows: answer.path,
      columns: [
        { heading: say('after-years'), show: (row) => count(row.year), full: (row) => row.year },
        { heading: say('balance-fixed'), show: (row) => count(row.under_care), full: (row) => row.under_care },
        { heading: say('balance-constant'), show: (row) => count(row.under_care_at_constant_rate), full: (row) => row.under_care_at_constant_rate },
      ],
    }),
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, say('balance-method')),
  ];
}

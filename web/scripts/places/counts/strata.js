/** Two groups compared within strata, from typed totals. */
import { answerBlock } from '../../parts/answer.js';
import { h } from '../../parts/element.js';
import { complete, numberFaults, typedGrid } from '../../parts/grid.js';
import { live } from '../../parts/live.js';
import { pooledTable } from '../../parts/pooled.js';
import { cautionList } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { exampleButtons } from './example.js';

const NUMBERS = ['exposed_events', 'exposed_total', 'unexposed_events', 'unexposed_total'];
const blank = () => ({ label: '', exposed_events: null, exposed_total: null, unexposed_events: null, unexposed_total: null });
const EMPTY = [blank(), blank()];

/** @param {import('../../app.js').App} app */
export function strataPart(app) {
  return answerBlock(app, {
    id: 'counts-strata',
    title: 'counts-strata-title',
    choices: form(app),
    empty: 'counts-strata-empty',
    ask: ({ counts }) => {
      const filled = counts.strata.filter((row) => NUMBERS.some((name) => typeof row[name] === 'number'));
      // A stratum half typed must not be left out of the pooled figures without a word.
      return filled.length && filled.every((row) => complete(row, NUMBERS)) ? { task: 'counts.strata', request: { strata: filled } } : null;
    },
    draw: (answer) => draw(app, answer),
  });
}

/** Invented: among the severe more got the treatment, so that crude and pooled differ. */
function example(say) {
  return [
    { label: say('counts-strata-example-1'), exposed_events: 6, exposed_total: 60, unexposed_events: 22, unexposed_total: 140 },
    { label: say('counts-strata-example-2'), exposed_events: 21, exposed_total: 90, unexposed_events: 19, unexposed_total: 50 },
  ];
}

function form(app) {
  return live(app, (state) => state.counts.strata, ({ counts }) => {
    const { say } = app.words;
    const typed = (strata) => (strata.length ? strata : EMPTY);
    const rows = typed(counts.strata);
    return [
      h('p', {}, say('counts-strata-lead')),
      typedGrid(app, {
        id: 'counts-strata-grid', caption: say('counts-strata-grid'), rows, current: () => typed(app.store.state.counts.strata), blank,
        columns: [
          { name: 'label', heading: say('stratum'), kind: 'text' },
          ...NUMBERS.map((name) => ({ name, heading: say(`typed-${name}`), kind: /** @type {'number'} */ ('number'), least: 0, step: 1 })),
        ],
        faults: (row) => ({ ...tooMany(app, row), ...numberFaults(app, row, NUMBERS) }),
        onchange: (strata) => app.store.amend('counts', { strata }),
      }),
      exampleButtons(app, 'strata', example(say), []),
    ];
  });
}

function tooMany(app, row) {
  const found = {};
  for (const group of ['exposed', 'unexposed']) {
    if (row[`${group}_events`] > row[`${group}_total`] && row[`${group}_total`] !== null) found[`${group}_events`] = app.words.say('fault-more-than-total');
  }
  return found;
}

function draw(app, answer) {
  const { say } = app.words;
  return [
    rowsTable(app, answer.rows),
    answer.rows.length > 1 ? null : exactNote(app, answer.rows[0]),
    pooledTable(app, {
      name: 'pooled-strata', pooled: answer.pooled, crude: answer.crude, homogeneity: answer.homogeneity,
      names: { exposed: say('typed-exposed'), reference: say('typed-unexposed') },
    }),
    changeNote(app, answer),
    answer.left_out.length ? h('p', { class: 'note' }, say('strata-left-out', { strata: answer.left_out.map(({ label, stratum }) => label || stratum + 1) })) : null,
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, say('strata-method')),
  ];
}

function rowsTable(app, rows) {
  const { say, count, percent, decimal, ratio, points, estimate } = app.words;
  const share = (number) => percent(number);
  const side = (group) => [
    {
      heading: say(`risk-${group}`), full: (row) => row[`${group}_risk`].value,
      show: (row) => say('risk-of', { events: count(row[`${group}_events`]), total: count(row[`${group}_total`]), risk: share(row[`${group}_risk`].value) }),
    },
    { heading: say(`odds-${group}`), show: (row) => decimal(row[`${group}_odds`], 3), full: (row) => row[`${group}_odds`] },
  ];
  return table(app, {
    name: 'strata', caption: say('strata-caption'), rows,
    columns: [
      { heading: say('stratum'), show: (row) => row.label || '–', text: true },
      ...side('exposed'),
      ...side('unexposed'),
      { heading: say('risk-ratio'), show: (row) => estimate(row.risk_ratio, ratio), full: (row) => row.risk_ratio.value },
      { heading: say('odds-ratio'), show: (row) => estimate(row.odds_ratio, ratio), full: (row) => row.odds_ratio.value },
      { heading: say('risk-difference'), show: (row) => estimate(row.risk_difference, points), full: (row) => row.risk_difference.value },
    ],
  });
}

function exactNote(app, { exact }) {
  if (!exact) return null;
  const { say, ratio, pValue, estimate } = app.words;
  return h('p', {}, say('exact-note', { odds: estimate(exact.odds_ratio, ratio), p: pValue(exact.p), mid: pValue(exact.mid_p) }));
}

/** Crude against pooled: whether the strata differed in more than the outcome. */
function changeNote(app, { rows, crude, pooled }) {
  if (rows.length < 2 || !crude.risk_ratio.value || !pooled.risk_ratio.value) return null;
  const { say, ratio } = app.words;
  return h('p', {}, say('crude-and-pooled', { crude: ratio(crude.risk_ratio.value), pooled: ratio(pooled.risk_ratio.value) }));
}

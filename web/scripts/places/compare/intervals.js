/** Two groups side by side in each interval of follow-up, then pooled over the intervals. */
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, selectOne } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { live } from '../../parts/live.js';
import { pooledTable } from '../../parts/pooled.js';
import { cautionList, levelName } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { DAYS_PER_MONTH, DAYS_PER_YEAR } from '../../units.js';
import { pairRequest } from './pair.js';

/** How many intervals are compared, by their length. */
const INTERVALS_SHOWN = { year: 5, quarter: 8 };

/** @param {import('../../app.js').App} app */
export function intervalsBlock(app) {
  return answerBlock(app, {
    id: 'intervals',
    title: 'intervals-title',
    empty: 'compare-choose-group',
    choices: stepChoice(app),
    ask: (state) => {
      const request = pairRequest(state);
      return request && { task: 'compare.intervals', request: { ...request, step: state.compare.step, intervals: state.compare.intervals } };
    },
    draw: (answer, state) => drawIntervals(app, answer, pairRequest(state), state.compare.step),
  });
}

function stepChoice(app) {
  return live(app, (state) => [state.compare.step, state.question.group], (state) => state.question.group ? [choiceRow(selectOne({
    id: 'compare-step', label: app.words.say('life-table-step'), value: state.compare.step,
    options: Object.keys(INTERVALS_SHOWN).map((step) => ({ value: step, label: app.words.say(`step-${step}`) })),
    onchange: (step) => app.store.amend('compare', { step, intervals: INTERVALS_SHOWN[step] }),
  }))] : []);
}

function drawIntervals(app, answer, { group, exposed, reference }, step) {
  const { say } = app.words;
  const names = { exposed: levelName(app, group, exposed), reference: levelName(app, group, reference) };
  return [
    h('p', {}, say('intervals-lead', names)),
    intervalsTable(app, answer, names, step),
    pooledTable(app, { name: 'pooled-intervals', pooled: answer.pooled, homogeneity: answer.homogeneity, names }),
    answer.left_out.length
      ? h('p', { class: 'note' }, say('intervals-left-out', { intervals: answer.left_out.map((row) => interval(app, row, step)) }))
      : null,
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, say('intervals-method')),
  ];
}

function interval(app, row, step) {
  const unit = step === 'year' ? DAYS_PER_YEAR : DAYS_PER_MONTH;
  const { say, count } = app.words;
  return say('interval-from-to', { from: count(Math.round(row.from_days / unit)), to: count(Math.round(row.to_days / unit)) });
}

function intervalsTable(app, answer, names, step) {
  const { say, count, decimal, percent, points, ratio, estimate } = app.words;
  const side = (which) => ({
    show: (row) => say('risk-of', { events: count(row[which].events), total: decimal(row[which].effective, 1), risk: percent(row[which].risk.value) }),
    full: (row) => row[which].risk.value,
  });
  return table(app, {
    name: 'intervals', caption: say('intervals-caption'), rows: answer.rows,
    columns: [
      { heading: say(step === 'year' ? 'interval-years' : 'interval-months'), show: (row) => interval(app, row, step), text: true },
      { heading: names.exposed, ...side('exposed') },
      { heading: names.reference, ...side('reference') },
      { heading: say('risk-ratio'), show: (row) => estimate(row.risk_ratio, ratio), full: (row) => row.risk_ratio?.value },
      { heading: say('odds-ratio'), show: (row) => estimate(row.odds_ratio, ratio), full: (row) => row.odds_ratio?.value },
      { heading: say('risk-difference'), show: (row) => estimate(row.risk_difference, points), full: (row) => row.risk_difference?.value },
    ],
  });
}

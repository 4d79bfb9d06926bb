/** Survival over time: the curve, its table, and what those lost could change. */
import { survivalCurve } from '../../charts/survival_curve.js';
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, selectOne } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { figure } from '../../parts/figure.js';
import { live } from '../../parts/live.js';
import { kindOfOutcome } from '../../parts/question.js';
import { cautionList, levelName } from '../../parts/said.js';
import { groupColumn, table } from '../../parts/table.js';
import { DAYS_PER_YEAR } from '../../units.js';

const YEARS = [1, 3, 5];
const INTERVALS = ['log-log', 'log', 'plain'];

/** @param {import('../../app.js').App} app */
export function survivalBlock(app) {
  return answerBlock(app, {
    id: 'survival',
    title: 'survival-title',
    choices: intervalChoice(app),
    ask: ({ cohort, question, outcomes }) => cohort && {
      task: 'outcomes.survival',
      request: { interest: question.interest, group: question.group, years: YEARS, interval: outcomes.interval },
    },
    draw: (answer, state) => drawSurvival(app, answer, state),
  });
}

function intervalChoice(app) {
  return live(app, (state) => state.outcomes.interval, (state) => [choiceRow(selectOne({
    id: 'outcomes-interval', label: app.words.say('interval-kind'), value: state.outcomes.interval,
    options: INTERVALS.map((kind) => ({ value: kind, label: app.words.say(`interval-${kind}`) })),
    onchange: (interval) => app.store.amend('outcomes', { interval }),
  }))]);
}

function drawSurvival(app, answer, { question }) {
  const { words } = app;
  const { say } = words;
  const name = (level) => levelName(app, question.group, level);
  return [
    ...answer.curves.map((curve) => sentence(app, curve, answer.interest, name)),
    figure(app, {
      name: 'survival', title: say(`survival-figure-${kindOfOutcome(answer.interest)}`),
      described: say('survival-figure-described', { curves: answer.curves.length }),
      draw: (width) => survivalCurve(curveData(answer, name), { width, words }),
      data: countsTable(app, answer, name),
    }),
    atYearsTable(app, answer, name),
    lossesTable(app, answer, name),
    cautionList(app, answer.cautions),
    answer.left_out.length ? h('p', { class: 'note' }, say('levels-left-out', { levels: answer.left_out.map(({ level }) => name(level)) })) : null,
    h('p', { class: 'method' }, say('survival-method', { interval: say(`interval-${answer.variant.interval}`) })),
  ];
}

/** The last of the asked-for years that follow-up reaches, in words. */
function sentence(app, curve, interest, name) {
  const { say, percent } = app.words;
  const group = curve.level === null ? '' : say('sentence-group', { group: name(curve.level) });
  const at = curve.at_years.filter((each) => !each.beyond_follow_up && each.estimate.value !== null).at(-1);
  if (!at) return h('p', { class: 'sentence' }, say('survival-sentence-short', { group, n: curve.n }));
  return h('p', { class: 'sentence' }, say(`survival-sentence-${kindOfOutcome(interest)}`, {
    group, years: at.years, n: curve.n, events: curve.events, survival: percent(at.estimate.value),
    interval: say('from-to', { lower: percent(at.estimate.lower), upper: percent(at.estimate.upper) }),
  }), ' ', medianSentence(app, curve));
}

function medianSentence(app, { median: { reached, estimate }, stop_time: supported }) {
  const { say, decimal } = app.words;
  if (!reached) return say('median-not-reached');
  // A median where the curve is no longer drawn hangs on a handful of patients.
  if (supported > 0 && estimate.value * DAYS_PER_YEAR > supported) return say('median-unsupported');
  const years = { median: decimal(estimate.value, 1), lower: decimal(estimate.lower, 1), upper: decimal(estimate.upper, 1) };
  return say(estimate.upper === null ? 'median-reached-open' : 'median-reached', years);
}

/** The engine's answer as the drawing wants it: years instead of days. */
function curveData(answer, name) {
  const inYears = (days) => days.map((day) => day / DAYS_PER_YEAR);
  const curves = answer.curves.map((curve, position) => ({
    label: name(curve.level),
    years: inYears(curve.time),
    survival: curve.survival,
    lower: curve.lower,
    upper: curve.upper,
    censorYears: inYears(curve.censor_time),
    censorSurvival: curve.censor_survival,
    stop: curve.stop_time === 0 ? null : curve.stop_time / DAYS_PER_YEAR,
    counts: {
      atRisk: answer.table[position].at_risk,
      events: answer.table[position].events,
      censored: answer.table[position].censored,
    },
  }));
  return { curves, ticks: answer.table_times };
}

/** At risk, outcomes so far and censored so far, at each whole year. */
function countsTable(app, answer, name) {
  const { say, count } = app.words;
  const rows = answer.table.flatMap((group) =>
    answer.table_times.map((years, i) => ({
      level: group.level, years, at_risk: group.at_risk[i], events: group.events[i], censored: group.censored[i],
    })));
  const number = (field) => ({ show: (row) => count(row[field]), full: (row) => row[field] });
  return table(app, {
    name: 'survival-counts', caption: say('survival-counts-caption'), rows,
    columns: [
      ...groupColumn(app, rows, name),
      { heading: say('years-since-start'), ...number('years') },
      { heading: say('row-atRisk'), ...number('at_risk') },
      { heading: say('events-so-far'), ...number('events') },
      { heading: say('censored-so-far'), ...number('censored') },
    ],
  });
}

function atYearsTable(app, answer, name) {
  const { say, count, percent, estimate } = app.words;
  const rows = answer.curves.flatMap((curve) => curve.at_years.map((at) => ({ ...at, level: curve.level })));
  const share = (number) => percent(number);
  return table(app, {
    name: 'survival-at-years', caption: say('survival-at-years-caption'), rows,
    columns: [
      ...groupColumn(app, rows, name),
      { heading: say('years-since-start'), show: (row) => count(row.years), full: (row) => row.years },
      { heading: say('row-atRisk'), show: (row) => count(row.at_risk), full: (row) => row.at_risk },
      {
        heading: say(`survival-heading-${kindOfOutcome(answer.interest)}`),
        show: (row) => (row.beyond_follow_up ? say('beyond-follow-up') : estimate(row.estimate, share)),
        full: (row) => row.estimate.value,
      },
      { heading: say('standard-error'), show: (row) => percent(row.estimate.standard_error), full: (row) => row.estimate.standard_error },
    ],
  });
}

/** What the figure would be if everyone lost had met the outcome, or none had. */
function lossesTable(app, answer, name) {
  const { say, count, percent } = app.words;
  const rows = answer.curves.flatMap(({ level, losses }) =>
    losses.bounds.map((bound) => ({ ...bound, level, lost: losses.lost, share: losses.share })));
  if (!rows.some((row) => row.lost > 0)) return h('p', {}, say('no-losses'));
  return table(app, {
    name: 'loss-bounds', caption: say('losses-caption'), rows, note: say('losses-note'),
    columns: [
      ...groupColumn(app, rows, name),
      { heading: say('years-since-start'), show: (row) => count(row.years), full: (row) => row.years },
      { heading: say('lost'), show: (row) => say('count-share', { count: count(row.lost), share: percent(row.share) }), full: (row) => row.lost },
      { heading: say('if-all-lost-died'), show: (row) => percent(row.all_died), full: (row) => row.all_died },
      { heading: say('if-none-lost-died'), show: (row) => percent(row.none_died), full: (row) => row.none_died },
    ],
  });
}

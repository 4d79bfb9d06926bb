/** Rank tests over the whole of follow-up: two or more groups, within strata, along an order, and pair by pair. */
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, numberField, selectOne } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { live } from '../../parts/live.js';
import { cautionList, covariateName, levelName } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { pairOf, timingOf } from './pair.js';

const WEIGHTS = ['log_rank', 'gehan', 'tarone_ware', 'peto_peto', 'fleming_harrington'];
const GREATEST_POWER = 5;

/** @param {import('../../app.js').App} app */
export function rankTestBlock(app) {
  return answerBlock(app, {
    id: 'rank-test',
    title: 'rank-test-title',
    empty: 'compare-choose-group',
    choices: choices(app),
    ask,
    draw: (answer, state) => drawRankTest(app, answer, state),
  });
}

/** @param {import('../../store.js').State} state */
function ask(state) {
  const { cohort, question: { interest, group }, compare: { weight, rho, gamma } } = state;
  const scores = scoresOf(state);
  if (!cohort || !group || !allowed(rho) || !allowed(gamma)) return null;
  if (scores && Object.values(scores).some((score) => score === null)) return null;
  const powers = weight === 'fleming_harrington' ? { rho, gamma } : {};
  return {
    task: 'compare.rank_test',
    request: { interest, group, weight, ...powers, stratify: stratifyOf(state), scores, timing: timingOf(state) },
  };
}

function allowed(power) {
  return power !== null && power >= 0 && power <= GREATEST_POWER;
}

/** The column to compare within; one that is gone, or is the group itself, is none. */
function stratifyOf({ cohort, question, compare }) {
  const known = cohort?.covariates.find((each) => each.id === compare.stratify && each.levels.length && each.id !== question.group);
  return known?.id ?? null;
}

/** A score for each group, its place in the list until another is typed; null when the groups have no order. */
function scoresOf(state) {
  const pair = pairOf(state);
  if (!pair || pair.levels.length < 3 || !state.compare.ordered) return null;
  const typed = state.compare.scores[pair.group] ?? {};
  return Object.fromEntries(pair.levels.map((level, position) => [level, level in typed ? typed[level] : position + 1]));
}

function choices(app) {
  const watched = ({ question, compare: { weight, rho, gamma, stratify, ordered, scores }, cohort }) =>
    [question.group, weight, rho, gamma, stratify, ordered, scores, cohort?.serial];
  return live(app, watched, (state) => {
    const pair = pairOf(state);
    if (!pair) return [];
    const { say } = app.words;
    const { weight, ordered } = state.compare;
    const columns = state.cohort.covariates.filter((each) => each.levels.length && each.id !== pair.group);
    return [
      choiceRow(
        selectOne({
          id: 'compare-weight', label: say('rank-weight'), hint: say('rank-weight-hint'), value: weight,
          options: WEIGHTS.map((each) => ({ value: each, label: say(`rank-${each}`) })),
          onchange: (chosen) => app.store.amend('compare', { weight: chosen }),
        }),
        weight === 'fleming_harrington' ? [powerField(app, state, 'rho'), powerField(app, state, 'gamma')] : null,
        selectOne({
          id: 'compare-stratify', label: say('rank-stratify'), hint: say('rank-stratify-hint'), value: stratifyOf(state) ?? '',
          options: [{ value: '', label: say('rank-stratify-none') }, ...columns.map(({ id }) => ({ value: id, label: covariateName(app, id) }))],
          onchange: (id) => app.store.amend('compare', { stratify: id || null }),
        }),
        pair.levels.length > 2 ? selectOne({
          id: 'compare-ordered', label: say('rank-ordered'), hint: say('rank-ordered-hint'), value: ordered ? 'yes' : 'no',
          options: ['no', 'yes'].map((value) => ({ value, label: say(`rank-ordered-${value}`) })),
          onchange: (value) => app.store.amend('compare', { ordered: value === 'yes' }),
        }) : null,
      ),
      scoreFields(app, state, pair.group),
    ];
  });
}

function powerField(app, state, name) {
  const { say } = app.words;
  const value = state.compare[name];
  return numberField({
    id: `compare-${name}`, label: say(`rank-${name}`), hint: say(`rank-${name}-hint`), value, least: 0, greatest: GREATEST_POWER,
    fault: allowed(value) ? null : say('rank-power-fault', { greatest: GREATEST_POWER }),
    onchange: (power) => app.store.amend('compare', { [name]: power }),
  });
}

function scoreFields(app, state, group) {
  const scores = scoresOf(state);
  if (!scores) return null;
  const { say } = app.words;
  const amend = (level, score) => app.store.amend('compare', {
    scores: { ...app.store.state.compare.scores, [group]: { ...app.store.state.compare.scores[group], [level]: score } },
  });
  return choiceRow(Object.entries(scores).map(([level, score], position) => numberField({
    id: `compare-score-${position}`, label: say('rank-score-of', { level: levelName(app, group, level) }), value: score,
    fault: score === null ? say('rank-score-fault') : null,
    onchange: (typed) => amend(level, typed),
  })));
}

function drawRankTest(app, answer, state) {
  const { say, count, decimal, ratio, pValue } = app.words;
  const { group } = state.question;
  const stratify = stratifyOf(state);
  const tested = { chi: decimal(answer.chi_squared, 2), df: answer.df, p: pValue(answer.p) };
  return [
    h('p', { class: 'sentence' }, say(answer.p < 0.05 ? 'rank-sentence-differ' : 'rank-sentence-may-be-chance', tested)),
    answer.unstratified && stratify
      ? h('p', {}, say('rank-stratified', { covariate: covariateName(app, stratify), p: pValue(answer.p), crude: pValue(answer.unstratified.p) }))
      : null,
    answer.trend ? h('p', {}, trendSentence(app, answer.trend)) : null,
    h('p', {}, say('rank-does-not-mean')),
    table(app, {
      name: 'rank-test', caption: say('rank-caption'), rows: answer.groups,
      columns: [
        { heading: say('group'), show: (row) => levelName(app, group, row.level), text: true },
        { heading: say('patients'), show: (row) => count(row.n), full: (row) => row.n },
        { heading: say('observed'), show: (row) => count(row.observed), full: (row) => row.observed },
        { heading: say('expected'), show: (row) => decimal(row.expected, 1), full: (row) => row.expected },
        { heading: say('observed-to-expected'), show: (row) => ratio(row.expected ? row.observed / row.expected : null) },
      ],
    }),
    answer.pairs.length ? pairsTable(app, answer.pairs, group) : null,
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, methods(app, answer, state.compare, stratify)),
  ];
}

function trendSentence(app, { z, p }) {
  const { say, decimal, pValue } = app.words;
  const direction = z > 0 ? 'up' : 'down';
  return say(p < 0.05 ? `rank-trend-${direction}` : 'rank-trend-chance', { z: decimal(z, 2), p: pValue(p) });
}

function pairsTable(app, pairs, group) {
  const { say, decimal, pValue } = app.words;
  const written = (value, write) => (value === null ? say('not-tested') : write(value));
  return table(app, {
    name: 'rank-pairs', caption: say('rank-pairs-caption', { n: pairs.filter(({ p }) => p !== null).length }), rows: pairs,
    columns: [
      { heading: say('rank-pair'), show: (row) => say('rank-pair-of', { first: levelName(app, group, row.first), second: levelName(app, group, row.second) }), text: true },
      { heading: say('chi-squared'), show: (row) => written(row.chi_squared, (value) => decimal(value, 2)), full: (row) => row.chi_squared },
      { heading: say('p-value'), show: (row) => written(row.p, pValue), full: (row) => row.p },
      { heading: say('adjusted-p'), show: (row) => written(row.adjusted_p, pValue), full: (row) => row.adjusted_p },
    ],
  });
}

function methods(app, answer, { rho, gamma }, stratify) {
  const { say } = app.words;
  return [
    say(`rank-method-${answer.weight}`, answer.weight === 'fleming_harrington' ? { rho, gamma } : {}),
    stratify && say('rank-method-stratified'),
    answer.trend && say('rank-method-trend'),
    answer.pairs.length && say('rank-method-pairs'),
  ].filter(Boolean).join(' ');
}

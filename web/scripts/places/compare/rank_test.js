/** A rank test over the whole of follow-up, for two or more groups. */
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, selectOne } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { live } from '../../parts/live.js';
import { cautionList, levelName } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { timingOf } from './pair.js';

const WEIGHTS = ['log_rank', 'gehan', 'tarone_ware', 'fleming_harrington'];

/** @param {import('../../app.js').App} app */
export function rankTestBlock(app) {
  return answerBlock(app, {
    id: 'rank-test',
    title: 'rank-test-title',
    empty: 'compare-choose-group',
    choices: weightChoice(app),
    ask: (state) => state.cohort && state.question.group && {
      task: 'compare.rank_test',
      request: {
        interest: state.question.interest, group: state.question.group, weight: state.compare.weight, timing: timingOf(state),
      },
    },
    draw: (answer, state) => drawRankTest(app, answer, state.question.group),
  });
}

function weightChoice(app) {
  return live(app, (state) => [state.compare.weight, state.question.group], (state) => state.question.group ? [choiceRow(selectOne({
    id: 'compare-weight', label: app.words.say('rank-weight'), hint: app.words.say('rank-weight-hint'), value: state.compare.weight,
    options: WEIGHTS.map((weight) => ({ value: weight, label: app.words.say(`rank-${weight}`) })),
    onchange: (weight) => app.store.amend('compare', { weight }),
  }))] : []);
}

function drawRankTest(app, answer, group) {
  const { say, count, decimal, ratio, pValue } = app.words;
  return [
    h('p', { class: 'sentence' }, say(answer.p < 0.05 ? 'rank-sentence-differ' : 'rank-sentence-may-be-chance', {
      chi: decimal(answer.chi_squared, 2), df: answer.df, p: pValue(answer.p),
    })),
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
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, say(`rank-method-${answer.weight}`)),
  ];
}

/** What the losses could change: survival over how the lost may have fared, and where the comparison tips. */
import { survivalByDelta } from '../../charts/survival_by_delta.js';
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, numberField } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { figure } from '../../parts/figure.js';
import { live } from '../../parts/live.js';
import { cautionList, levelName } from '../../parts/said.js';
import { table } from '../../parts/table.js';

const LONGEST = 150;

/** @param {import('../../app.js').App} app */
export function tippingBlock(app) {
  return answerBlock(app, {
    id: 'tipping',
    title: 'tipping-title',
    choices: yearsChoice(app),
    empty: 'mean-time-empty',
    ask: ({ cohort, question, outcomes: { lostYears } }) => cohort && lostYears > 0 && lostYears <= LONGEST && {
      task: 'outcomes.tipping', request: { interest: question.interest, group: question.group, years: lostYears },
    },
    draw: (answer, { question }) => draw(app, answer, question.group),
  });
}

function yearsChoice(app) {
  return live(app, (state) => state.outcomes.lostYears, ({ outcomes: { lostYears } }) => [choiceRow(numberField({
    id: 'tipping-years', label: app.words.say('tipping-years'), value: lostYears, least: 0.1, greatest: LONGEST,
    fault: lostYears > 0 ? null : app.words.say('fault-not-positive'),
    onchange: (years) => app.store.amend('outcomes', { lostYears: years }),
  }))]);
}

function draw(app, answer, group) {
  const { say } = app.words;
  const name = (level) => (level === null ? say('everyone') : levelName(app, group, level));
  const lines = answer.groups.map(({ level, lost, n, survival }) => ({ label: name(level), lost, n, survival }));
  return [
    ...lines.map((line) => sentence(app, line, answer)),
    ...answer.against.map((pair) => tipSentence(app, pair, { name, first: lines[0].label, answer })),
    h('p', {}, say('tipping-does-not-mean')),
    figure(app, {
      name: 'tipping', title: say('tipping-figure', { years: answer.years }), described: say('tipping-figure-described', { groups: lines.length }),
      draw: (width) => survivalByDelta({ deltas: answer.deltas, lines }, { width, words: app.words }),
      data: survivalTable(app, lines, answer),
    }),
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, say('tipping-method', { resamples: answer.resamples, seed: answer.seed })),
  ];
}

function sentence(app, { label, lost, n, survival }, { deltas, years }) {
  const { say, count, percent } = app.words;
  const at = (delta) => percent(survival[deltas.indexOf(delta)].value);
  return h('p', { class: 'sentence' }, say('tipping-sentence', {
    group: label, lost: count(lost), n: count(n), years, alike: at(1), double: at(2), most: at(deltas.at(-1)), times: deltas.at(-1),
  }));
}

function tipSentence(app, { level, better, differences, tips_at: tipsAt }, { name, first, answer: { deltas } }) {
  const { say, amount } = app.words;
  const { lower, upper } = differences[deltas.indexOf(1)];
  const clear = lower > 0 || upper < 0;
  const key = `tipping-${clear ? 'clear' : 'unclear'}-${tipsAt === null ? 'holds' : 'tips'}`;
  return h('p', {}, say(key, { group: name(level), first, better: name(better), times: amount(tipsAt === null ? deltas.at(-1) : Number(tipsAt.toPrecision(2))) }));
}

function survivalTable(app, lines, { deltas, years }) {
  const { say, amount, percent, estimate } = app.words;
  return table(app, {
    name: 'tipping', caption: say('tipping-caption', { years }), rows: deltas.map((delta, i) => ({ delta, i })),
    columns: [
      { heading: say('tipping-delta'), show: ({ delta }) => amount(delta), full: ({ delta }) => delta },
      ...lines.map(({ label, survival }) => ({
        heading: label, show: ({ i }) => estimate(survival[i], (share) => percent(share)), full: ({ i }) => survival[i].value,
      })),
    ],
  });
}

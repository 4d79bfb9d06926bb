/** How long on average within a horizon, and what lies ahead of those who have come so far. */
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, numberField } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { live } from '../../parts/live.js';
import { kindOfOutcome } from '../../parts/question.js';
import { cautionList, levelName } from '../../parts/said.js';
import { table } from '../../parts/table.js';

const LONGEST = 150;

/** @param {import('../../app.js').App} app */
export function meanTimeBlock(app) {
  return answerBlock(app, {
    id: 'mean-time',
    title: 'mean-time-title',
    choices: choices(app),
    empty: 'mean-time-empty',
    ask: ({ cohort, question, outcomes: { horizon, further } }) => cohort && allowed(further) && (horizon === null || allowed(horizon)) && {
      task: 'outcomes.mean_time',
      request: { interest: question.interest, group: question.group, horizon_years: horizon, further_years: further },
    },
    draw: (answer, { question }) => draw(app, answer, question),
  });
}

function allowed(years) {
  return years !== null && years > 0 && years <= LONGEST;
}

function choices(app) {
  return live(app, (state) => [state.outcomes.horizon, state.outcomes.further], ({ outcomes: { horizon, further } }) => {
    const { say } = app.words;
    const field = (name, value, hint, mayBeEmpty) => numberField({
      id: `mean-time-${name}`, label: say(`mean-time-${name}`), hint: hint && say(hint), value, least: 0.1, greatest: LONGEST,
      fault: allowed(value) || (mayBeEmpty && value === null) ? null : say('fault-not-positive'),
      onchange: (years) => app.store.amend('outcomes', { [name]: years }),
    });
    return [choiceRow(field('horizon', horizon, 'mean-time-horizon-hint', true), field('further', further, null, false))];
  });
}

function draw(app, answer, question) {
  const { say } = app.words;
  const kind = kindOfOutcome(question.interest);
  const groups = answer.groups.map((group) => ({ ...group, name: group.level === null ? say('everyone') : levelName(app, question.group, group.level) }));
  return [
    ...groups.map((group) => sentence(app, group, groups[0].name, answer.horizon_years, kind)),
    meansTable(app, groups, answer.horizon_years, kind),
    aheadTable(app, groups, kind),
    h('p', {}, say('mean-time-does-not-mean')),
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, say('mean-time-method')),
  ];
}

function sentence(app, { name, mean: { mean }, difference }, first, horizon, kind) {
  const { say, decimal } = app.words;
  const said = { group: name, horizon, mean: decimal(mean.value), interval: say('from-to', { lower: decimal(mean.lower), upper: decimal(mean.upper) }) };
  if (!difference) return h('p', { class: 'sentence' }, say(`mean-time-sentence-${kind}`, said));
  return h('p', { class: 'sentence' }, say(`mean-time-sentence-compared-${kind}`, {
    ...said, first, difference: decimal(difference.value), between: say('from-to', { lower: decimal(difference.lower), upper: decimal(difference.upper) }),
  }));
}

function meansTable(app, groups, horizon, kind) {
  const { say, decimal, estimate } = app.words;
  const years = (number) => decimal(number);
  return table(app, {
    name: 'mean-time', caption: say('mean-time-caption', { horizon }), rows: groups,
    columns: [
      { heading: say('group'), show: (row) => row.name, text: true },
      { heading: say(`mean-time-${kind}`), show: (row) => estimate(row.mean.mean, years), full: (row) => row.mean.mean.value },
      { heading: say('mean-time-lost'), show: (row) => estimate(row.mean.lost, years), full: (row) => row.mean.lost.value },
      { heading: say('mean-time-difference'), show: (row) => (row.difference ? estimate(row.difference, years) : '–'), full: (row) => row.difference?.value ?? null },
    ],
  });
}

function aheadTable(app, groups, kind) {
  const { say, amount, count, percent, estimate } = app.words;
  const rows = groups.flatMap((group) => group.ahead.map((each) => ({ group: group.name, ...each })));
  return table(app, {
    name: 'ahead', caption: say(`ahead-caption-${kind}`, { years: rows[0].further_years }), rows,
    columns: [
      { heading: say('group'), show: (row) => row.group, text: true },
      { heading: say('ahead-survived'), show: (row) => amount(row.survived_years), full: (row) => row.survived_years },
      { heading: say('row-atRisk'), show: (row) => count(row.at_risk), full: (row) => row.at_risk },
      { heading: say('ahead-share'), show: (row) => (row.code ? say(`ahead-${row.code}`) : estimate(row.estimate, (share) => percent(share))), full: (row) => row.estimate.value },
    ],
  });
}

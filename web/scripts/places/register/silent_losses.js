/** Losses that nobody wrote down: from how many months unseen somebody counts as lost, and what that changes. */
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, numberField } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { live } from '../../parts/live.js';
import { cautionList } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { requestOf } from './reader.js';

/** The finding whose repair is this rule. */
const RULE = 'unseen_for_long';

/** @param {import('../../app.js').App} app */
export function silentLossesBlock(app) {
  return answerBlock(app, {
    id: 'silent-losses',
    title: 'silent-title',
    empty: 'findings-empty',
    choices: choices(app),
    ask: ({ cohort }) => cohort && { task: 'register.silent_losses', request: requestOf(cohort.reading) },
    draw: (answer) => {
      const { say } = app.words;
      return [
        h('p', { class: 'sentence' }, sentence(app, answer)),
        months(app, answer),
        cautionList(app, answer.cautions),
        h('p', { class: 'method' }, say('silent-method')),
      ];
    },
  });
}

function choices(app) {
  return live(app, ({ cohort, reading }) => [Boolean(cohort), reading.unseen_months, RULE in reading.repairs], ({ cohort, reading }) => {
    if (!cohort) return [];
    const { say } = app.words;
    return [choiceRow(
      numberField({
        id: 'unseen-months', label: say('silent-months'), hint: say('silent-months-hint'), value: reading.unseen_months, least: 1, greatest: 120, step: 1,
        onchange: (unseen_months) => unseen_months >= 1 && unseen_months <= 120 && app.store.amend('reading', { unseen_months }),
      }),
      h('div', { class: 'choice' }, h('label', { class: 'tick' },
        h('input', { type: 'checkbox', id: 'silent-count', checked: RULE in reading.repairs, onchange: (event) => count(app, event.target.checked) }),
        ' ', say('silent-count'))))];
  });
}

function count(app, wanted) {
  const { [RULE]: had, ...others } = app.store.state.reading.repairs;
  app.store.amend('reading', { repairs: wanted ? { ...others, [RULE]: had ?? [] } : others });
}

function sentence(app, answer) {
  const { say, percent } = app.words;
  const chosen = answer.rows.find((row) => row.months === answer.months);
  return say(answer.counted ? 'silent-sentence-counted' : 'silent-sentence', {
    changed: chosen.changed, care: answer.under_care, months: answer.months, before: answer.written_lost, after: chosen.lost,
    share: percent(chosen.share), was: percent(answer.n ? answer.written_lost / answer.n : null),
  });
}

function months(app, { rows, months: chosen }) {
  const { say, count: number, decimal, percent } = app.words;
  const written = (each) => (Number.isInteger(each) ? number(each) : decimal(each, 1));
  return table(app, {
    name: 'silent-losses', caption: say('silent-caption'), rows,
    rowClass: (row) => (row.months === chosen ? 'chosen' : null),
    columns: [
      { heading: say('silent-unseen'), show: (row) => written(row.months), full: (row) => row.months },
      { heading: say('silent-changed'), show: (row) => number(row.changed), full: (row) => row.changed },
      { heading: say('silent-lost'), show: (row) => number(row.lost), full: (row) => row.lost },
      { heading: say('share'), show: (row) => percent(row.share), full: (row) => row.share },
    ],
  });
}

/** How strong one lever must be so that a target is reached. */
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, numberField, selectOne } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { live } from '../../parts/live.js';
import { cautionList } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { itemsAsked, typedFaultless } from './items.js';
import { setting } from './request.js';

/** Levers of a single percentage. */
const KINDS = ['fewer_lost', 'fewer_deaths', 'fewer_stopped', 'more_completed', 'fewer_newcomers'];
const GOALS = ['under_care', 'lost', 'deaths', 'cost'];

/** @param {import('../../app.js').App} app */
export function breakEvenBlock(app) {
  return answerBlock(app, {
    id: 'break-even',
    title: 'break-even-title',
    choices: choices(app),
    empty: 'break-even-type',
    ask: request,
    draw: (answer, state) => draw(app, answer, state.caseload.breakEven.kind),
  });
}

function request(state) {
  const asked = setting(state);
  const { breakEven, discount } = state.caseload;
  if (!asked || breakEven.target === null || breakEven.target < 0 || !typedFaultless(state.caseload)) return null;
  return {
    task: 'caseload.break_even',
    request: { ...asked, lever: { kind: breakEven.kind }, goal: breakEven.goal, target: breakEven.target, items: itemsAsked(state.caseload), discount },
  };
}

function choices(app) {
  return live(app, ({ caseload }) => caseload.breakEven, ({ caseload: { breakEven } }) => {
    const { say } = app.words;
    const change = (patch) => app.store.amend('caseload', { breakEven: { ...app.store.state.caseload.breakEven, ...patch } });
    return [choiceRow(
      selectOne({
        id: 'break-even-kind', label: say('break-even-kind'), value: breakEven.kind,
        options: KINDS.map((kind) => ({ value: kind, label: say(`lever-${kind}`) })), onchange: (kind) => change({ kind }),
      }),
      selectOne({
        id: 'break-even-goal', label: say('break-even-goal'), value: breakEven.goal,
        options: GOALS.map((goal) => ({ value: goal, label: say(`goal-${goal}`) })), onchange: (goal) => change({ goal }),
      }),
      numberField({
        id: 'break-even-target', label: say('break-even-target'), value: breakEven.target, least: 0,
        fault: breakEven.target < 0 ? say('fault-negative') : null, onchange: (target) => change({ target }),
      }))];
  });
}

function draw(app, answer, kind) {
  const { say, count, decimal, percent, day } = app.words;
  const named = { lever: say(`lever-${kind}`), goal: say(`goal-${answer.goal}`), target: count(answer.target), ends: day(answer.ends) };
  const rows = [
    { percent: 0, reached: answer.at_none },
    ...(answer.percent === null ? [] : [{ percent: answer.percent, reached: answer.target }]),
    { percent: answer.most, reached: answer.at_most },
  ];
  return [
    h('p', { class: 'sentence' }, answer.percent === null
      ? say('break-even-never', { ...named, none: count(answer.at_none), most: count(answer.at_most), percent: decimal(answer.most, 0) })
      : say('break-even-sentence', { ...named, percent: decimal(answer.percent, 1), share: percent(answer.reached_in, 0) })),
    table(app, {
      name: 'break-even', caption: say('break-even-caption', named), rows,
      columns: [
        { heading: named.lever, show: (row) => say('in-percent', { percent: decimal(row.percent, 1) }), full: (row) => row.percent },
        { heading: named.goal, show: (row) => count(row.reached), full: (row) => row.reached },
      ],
    }),
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, say('break-even-method')),
  ];
}

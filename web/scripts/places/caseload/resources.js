/** What the caseload takes: visits, medicine and money for each patient-year of care. */
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, numberField } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { live } from '../../parts/live.js';
import { table } from '../../parts/table.js';
import { bandColumns } from './bands.js';
import { projectionRequest } from './request.js';

const ITEMS = ['visits', 'medicine_units', 'cost'];

/** @param {import('../../app.js').App} app */
export function resourcesBlock(app) {
  return answerBlock(app, {
    id: 'resources',
    title: 'resources-title',
    choices: choices(app),
    empty: 'resources-type',
    ask: (state) => (ITEMS.some((item) => state.caseload.resources[item] > 0) ? projectionRequest(state) : null),
    draw: (answer, state) => drawResources(app, answer, state.caseload.resources),
  });
}

function choices(app) {
  return live(app, (state) => state.caseload.resources, ({ caseload }) => {
    const { say } = app.words;
    return [choiceRow(...ITEMS.map((item) => numberField({
      id: `resources-${item}`, label: say(`resource-${item}-per`), value: caseload.resources[item], least: 0,
      onchange: (amount) => app.store.amend('caseload', { resources: { ...app.store.state.caseload.resources, [item]: Math.max(0, amount ?? 0) } }),
    })))];
  });
}

function drawResources(app, answer, asked) {
  const { say, day, count } = app.words;
  const items = ITEMS.filter((item) => asked[item] > 0);
  const rows = answer.years.map(({ ends }, i) => ({ ends, i }));
  return [
    h('p', { class: 'sentence' }, items.map((item) => say(`resource-${item}-sentence`, {
      years: answer.years.length, amount: count(answer.baseline.resources[item].at(-1).value),
    })).join(' ')),
    ...items.map((item) => table(app, {
      name: `resources-${item}`, caption: say(`resource-${item}`), rows,
      columns: [
        { heading: say('year-to'), show: (row) => day(row.ends), text: true },
        ...bandColumns(app, say('baseline'), (row) => answer.baseline.resources[item][row.i]),
        ...(answer.what_if ? [{
          heading: say('what-if'), show: (row) => count(answer.what_if.resources[item][row.i].value),
          full: (row) => answer.what_if.resources[item][row.i].value,
        }] : []),
      ],
    })),
    h('p', { class: 'method' }, say('resources-method')),
  ];
}

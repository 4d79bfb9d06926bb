/** The difference that people feel: survival of the two groups at chosen times, in percentage points. */
import { answerBlock } from '../../parts/answer.js';
import { h } from '../../parts/element.js';
import { cautionList, levelName } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { pairRequest } from './pair.js';

const YEARS = [1, 3, 5];

/** @param {import('../../app.js').App} app */
export function differenceBlock(app) {
  return answerBlock(app, {
    id: 'difference',
    title: 'difference-title',
    empty: 'compare-choose-group',
    ask: (state) => {
      const request = pairRequest(state);
      return request && { task: 'compare.difference', request: { ...request, years: YEARS } };
    },
    draw: (answer, state) => drawDifference(app, answer, pairRequest(state)),
  });
}

function drawDifference(app, answer, { group, exposed, reference }) {
  const { say, count, percent, points, estimate } = app.words;
  const reached = answer.rows.filter((row) => !row.beyond_follow_up).at(-1);
  const names = { exposed: levelName(app, group, exposed), reference: levelName(app, group, reference) };
  const cell = (field, write) => ({
    show: (row) => (row.beyond_follow_up ? say('beyond-follow-up') : estimate(row[field], write)),
    full: (row) => row[field]?.value,
  });
  return [
    reached
      ? h('p', { class: 'sentence' }, say('difference-sentence', {
          ...names, years: reached.years,
          inExposed: percent(reached.exposed.value), inReference: percent(reached.reference.value),
          difference: points(reached.difference.value),
          interval: say('from-to', { lower: points(reached.difference.lower), upper: points(reached.difference.upper) }),
        }))
      : null,
    table(app, {
      name: 'difference', caption: say('difference-caption'), rows: answer.rows,
      columns: [
        { heading: say('years-since-start'), show: (row) => count(row.years), full: (row) => row.years },
        { heading: names.exposed, ...cell('exposed', (share) => percent(share)) },
        { heading: names.reference, ...cell('reference', (share) => percent(share)) },
        { heading: say('difference-points'), ...cell('difference', points) },
      ],
    }),
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, say('difference-method')),
  ];
}

/** Values of the columns to group by that are probably one value, misspelt: to be made one, or left. */
import { answerBlock } from '../../parts/answer.js';
import { h, written } from '../../parts/element.js';
import { covariateName } from '../../parts/said.js';
import { table } from '../../parts/table.js';

/** @param {import('../../app.js').App} app */
export function spellingsBlock(app) {
  let pressed = null;
  const drawn = (answer, state, decision) => [
    ...answer.columns.map(({ column, variants }) => variantsTable(app, column, variants, decision)),
    h('p', { class: answer.columns.length ? 'method' : 'sentence' }, app.words.say(answer.columns.length ? 'spellings-method' : 'spellings-none')),
  ];
  const merged = (column, value) => app.store.state.reading.spellings[column]?.[value] !== undefined;
  const merge = (id, column, { value, into }, wanted) => {
    pressed = id;
    const { spellings } = app.store.state.reading;
    const { [value]: _, ...others } = spellings[column] ?? {};
    app.store.amend('reading', { spellings: { ...spellings, [column]: wanted ? { ...others, [value]: into } : others } });
  };
  return answerBlock(app, {
    id: 'spellings',
    title: 'spellings-title',
    empty: 'findings-empty',
    ask: ({ cohort }) => cohort && { task: 'register.spellings', request: { columns: groupColumns(cohort.reading) } },
    draw: (answer, state) => {
      const back = pressed;
      pressed = null;
      if (back) setTimeout(() => document.getElementById(back)?.focus());
      return drawn(answer, state, (column, variant, i) => {
        const id = `spelling-${column}-${i}`;
        return h('label', { class: 'tick' }, h('input', {
          type: 'checkbox', id, checked: merged(column, variant.value),
          'aria-label': app.words.say('spelling-merge-of', { value: variant.value, into: variant.into }),
          onchange: (event) => merge(id, column, variant, event.target.checked),
        }), ' ', app.words.say('spelling-merge'));
      });
    },
    paper: (answer, state) => drawn(answer, state, (column, { value }) =>
      app.words.say(merged(column, value) ? 'repair-accepted' : 'repair-not-accepted')),
  });
}

function groupColumns(reading) {
  return Object.entries(reading.roles).filter(([, role]) => role === 'group').map(([id]) => id);
}

function variantsTable(app, column, variants, decision) {
  const { say, count } = app.words;
  return table(app, {
    name: `spellings-${column}`, caption: say('spellings-caption', { heading: covariateName(app, column) }), rows: variants.map((variant, i) => ({ ...variant, i })),
    columns: [
      { heading: say('value'), show: (row) => written(row.value), text: true },
      { heading: say('rows'), show: (row) => count(row.count), full: (row) => row.count },
      { heading: say('spelling-into'), show: (row) => written(row.into), text: true },
      { heading: say('rows'), show: (row) => count(row.into_count), full: (row) => row.into_count },
      { heading: say('decision'), show: (row) => decision(column, row, row.i), text: true },
    ],
  });
}

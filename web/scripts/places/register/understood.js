/** What was understood: who is in the cohort, who was set aside and why, and what to do next. */
import { h } from '../../parts/element.js';
import { live } from '../../parts/live.js';
import { cautionList, covariateName, named, refusalNote } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { whatIsMissing } from './reader.js';

/** @param {import('../../app.js').App} app */
export function understoodBlock(app) {
  return live(app, (state) => [state.cohort?.serial, state.building, state.source && whatIsMissing(state)], (state) => {
    const { say } = app.words;
    return [h('section', { 'aria-labelledby': 'understood-heading', 'aria-live': 'polite' },
      h('h2', { id: 'understood-heading' }, say('understood-title')),
      ...content(app, state))];
  });
}

function content(app, state) {
  const { say } = app.words;
  const missing = whatIsMissing(state);
  if (missing.length) return [h('p', {}, say('still-missing')), h('ul', {}, missing.map((key) => h('li', {}, say(key))))];
  if (state.building) return [refusalNote(app, state.building)];
  if (!state.cohort) return [h('p', { class: 'hint' }, say('working'))];
  return understood(app, state.cohort);
}

function understood(app, cohort) {
  const { say, decimal, day } = app.words;
  return [
    h('p', { class: 'sentence' }, say('understood-sentence', {
      n: cohort.n, rows: cohort.rows, years: decimal(cohort.person_years, 0),
      first: day(cohort.first_start), last: day(cohort.last_start), closing: day(cohort.closing_date),
    })),
    outcomesTable(app, cohort),
    ...lines(app, 'set-aside', cohort.set_aside, cohort.set_aside_counts),
    ...lines(app, 'changed', cohort.changed, cohort.changed_counts),
    h('p', {}, say('dropped-columns', { columns: cohort.dropped.map((id) => covariateName(app, id)) })),
    cautionList(app, cohort.cautions),
    h('p', { class: 'next' }, say('next'), ' ', ['outcomes', 'compare', 'caseload'].flatMap((place, i) => [
      i ? ' · ' : '', h('a', { href: `#${place}` }, say(`place-${place}`))])),
  ];
}

function outcomesTable(app, cohort) {
  const { say, count, percent } = app.words;
  const rows = Object.entries(cohort.outcomes).filter(([, n]) => n > 0).map(([meaning, n]) => ({ meaning, n }));
  return table(app, {
    name: 'outcomes', caption: say('outcomes-caption'), rows,
    columns: [
      { heading: say('how-it-ended'), show: (row) => say(`meaning-${row.meaning}`), text: true },
      { heading: say('patients'), show: (row) => count(row.n), full: (row) => row.n },
      { heading: say('share'), show: (row) => percent(row.n / cohort.n), full: (row) => row.n / cohort.n },
    ],
  });
}

/** Rows set aside, or changed: how many for each reason, and every line on request. */
function lines(app, kind, entries, counts) {
  const { say, count } = app.words;
  if (!entries.length) return [h('p', {}, say(`${kind}-nothing`))];
  const reasons = Object.entries(counts).map(([code, n]) => ({ code, n }));
  return [
    h('h3', {}, say(`${kind}-title`, { n: entries.length })),
    table(app, {
      name: `${kind}-reasons`, caption: say(`${kind}-caption`), rows: reasons, saveable: false,
      columns: [
        { heading: say('reason'), show: (row) => say(`${kind}-${row.code}-short`), text: true },
        { heading: say('rows'), show: (row) => count(row.n), full: (row) => row.n },
      ],
    }),
    h('details', { class: 'behind' }, h('summary', {}, say('every-line')),
      table(app, {
        name: `${kind}-lines`, caption: say(`${kind}-lines-caption`), rows: entries,
        columns: [
          { heading: say('line'), show: (row) => count(row.line), full: (row) => row.line },
          { heading: say('reason'), show: (row) => say(`${kind}-${row.code}`, named(app, row.parameters)), text: true },
        ],
      })),
  ];
}

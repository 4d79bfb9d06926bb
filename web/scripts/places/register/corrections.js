/** What was corrected, cell by cell, to be taken back to the record room. */
import { h } from '../../parts/element.js';
import { table } from '../../parts/table.js';

/**
 * @param {import('../../app.js').App} app
 * @param {Array<{line: number, code: string, what: string, before: string|number|null, after: string|number|null}>} corrections
 */
export function correctionsTable(app, corrections) {
  const { say, count } = app.words;
  if (!corrections.length) return h('p', {}, say('corrections-none'));
  return table(app, {
    name: 'corrections', caption: say('corrections-caption'), rows: corrections,
    columns: [
      { heading: say('line'), show: ({ line }) => count(line), full: ({ line }) => line },
      { heading: say('correction-what'), show: ({ what }) => say(`change-of-${what}`), text: true },
      { heading: say('correction-before'), show: ({ what, before }) => value(app, what, before), text: true },
      { heading: say('correction-after'), show: ({ what, after }) => value(app, what, after), text: true },
      { heading: say('reason'), show: ({ code }) => say(`finding-${code}-short`), text: true },
    ],
  });
}

/** One change as a phrase; its line is named where it is not that of the row. */
export function saidChange(app, { line, what, before, after }, rowLine) {
  const { say } = app.words;
  const said = what === 'same_as' || what === 'number'
    ? say(`change-${what}`, { line, after: after ?? '' })
    : say('change-to', { what: say(`change-of-${what}`), before: value(app, what, before), after: value(app, what, after) });
  return line === rowLine || what === 'same_as' ? said : say('change-on-line', { line, change: said });
}

function value(app, what, told) {
  const { say, day } = app.words;
  if (what === 'number') return '–';
  if (told === null) return say('nothing-written');
  if (what === 'same_as') return say('on-line', { line: told });
  if (what === 'outcome') return app.words.has(`meaning-${told}`) ? say(`meaning-${told}`) : told;
  return /^\d{4}-\d{2}-\d{2}$/.test(told) ? day(told) : told;
}

/** Report: what was shown, in order, to be printed or kept as a file. */
import { button, choiceRow, textField, tickSeveral } from '../parts/choices.js';
import { h } from '../parts/element.js';
import { live } from '../parts/live.js';
import { save } from '../parts/save.js';
import { reportDocument } from './report/document.js';
import { asOneFile } from './report/one_file.js';

/** @param {import('../app.js').App} app */
export function reportPlace(app) {
  return live(app, () => null, () => [
    h('div', { 'data-screen-only': true }, heading(app), fields(app), pieceChoices(app), actions(app)),
    live(app, dependsOn, () => [reportDocument(app)], { id: 'report-document' }),
  ]);
}

/** The document is only drawn while it is looked at. @param {import('../store.js').State} state */
function dependsOn(state) {
  if (state.place !== 'report') return 'hidden';
  return [state.report, state.reportSerial, state.cohort?.serial, state.engine.version];
}

function heading(app) {
  const { say } = app.words;
  return [h('h1', {}, say('report-title')), h('p', {}, say('report-lead'))];
}

function fields(app) {
  return live(app, (state) => state.report, ({ report }) => {
    const { say } = app.words;
    const field = (name, hint) => textField({
      id: `report-${name}`, label: say(`report-field-${name}`), hint, value: report[name],
      onchange: (value) => app.store.amend('report', { [name]: value }),
    });
    return [choiceRow(field('title'), field('hospital'), field('author'), field('date', say('report-date-hint')))];
  });
}

function pieceChoices(app) {
  return live(app, (state) => [state.report.leftOut, app.report.pieces().map(({ id }) => id)], ({ report }) => {
    const { say } = app.words;
    const pieces = app.report.pieces();
    if (!pieces.length) return [h('p', { class: 'empty' }, say('report-empty'))];
    const ids = pieces.map(({ id }) => id);
    return [tickSeveral({
      id: 'report-pieces', legend: say('report-pieces'),
      options: pieces.map(({ id, title }) => ({ value: id, label: say(title) })),
      values: ids.filter((id) => !report.leftOut.includes(id)),
      onchange: (kept) => app.store.amend('report', { leftOut: ids.filter((id) => !kept.includes(id)) }),
    })];
  });
}

function actions(app) {
  const { say } = app.words;
  return h('p', { class: 'actions' },
    button(say('report-print'), () => window.print(), { id: 'report-print' }), ' ',
    button(say('report-save'), () => {
      save('report.html', 'text/html', asOneFile(app, document.querySelector('#report-document .report')));
    }, { id: 'report-save', class: 'plain' }));
}

/** The frame around the places: words of the template, language, undo, the list of places. */
import { button, selectOne } from './parts/choices.js';
import { h } from './parts/element.js';
import { live } from './parts/live.js';
import { drawEngineState } from './engine_state.js';
import { caseloadPlace } from './places/caseload.js';
import { comparePlace } from './places/compare.js';
import { countsPlace } from './places/counts.js';
import { outcomesPlace } from './places/outcomes.js';
import { registerPlace } from './places/register.js';
import { reportPlace } from './places/report.js';
import { LANGUAGES } from './words.js';

/** The places by the name that stands in the address; each draws its section once. */
const PLACES = {
  register: registerPlace,
  outcomes: outcomesPlace,
  compare: comparePlace,
  caseload: caseloadPlace,
  counts: countsPlace,
  report: reportPlace,
};

/** @param {import('./app.js').App} app */
export function drawShell(app) {
  const content = document.getElementById('content');
  for (const [name, place] of Object.entries(PLACES)) {
    content.append(h('div', { id: `place-${name}`, class: 'place', hidden: true }, place(app)));
  }
  document.getElementById('desk-tools').append(live(app, deskTools, () => drawDeskTools(app), { class: 'tools' }));
  document.getElementById('engine-state').append(drawEngineState(app));
  app.store.subscribe(() => translateTemplate(app));
  app.speak(app.store.state.language);
  window.addEventListener('hashchange', () => showPlace(app, true));
  window.addEventListener('beforeunload', (event) => {
    if (app.store.state.source) event.preventDefault();
  });
  document.addEventListener('keydown', (event) => undoByKeyboard(app, event));
  showPlace(app, false);
}

function placeNow() {
  const name = location.hash.slice(1);
  return name in PLACES ? name : 'register';
}

function showPlace(app, moveFocus) {
  const now = placeNow();
  app.store.change({ place: now });
  for (const name of Object.keys(PLACES)) {
    const box = document.getElementById(`place-${name}`);
    box.hidden = name !== now;
    if (name === now && moveFocus) {
      const heading = box.querySelector('h1');
      heading.tabIndex = -1;
      heading.focus();
    }
  }
  drawPlaceList(app);
}

function drawPlaceList(app) {
  const now = placeNow();
  document.getElementById('places').replaceChildren(
    h('ul', {}, Object.keys(PLACES).map((name) =>
      h('li', {}, h('a', { href: `#${name}`, 'aria-current': name === now ? 'page' : null }, app.words.say(`place-${name}`))))));
  document.title = app.words.say('page-title', { place: app.words.say(`place-${now}`) });
}

function translateTemplate(app) {
  const { say, language } = app.words;
  if (document.body.dataset.language === language) return;
  document.body.dataset.language = language;
  for (const element of document.querySelectorAll('[data-word]')) element.textContent = say(element.getAttribute('data-word'));
  for (const element of document.querySelectorAll('[data-word-label]')) {
    element.setAttribute('aria-label', say(element.getAttribute('data-word-label')));
  }
  drawPlaceList(app);
}

const deskTools = (state) => [state.reading, state.question, state.outcomes, state.compare, state.caseload, state.counts, state.report];

function drawDeskTools(app) {
  const { say, language } = app.words;
  return [
    selectOne({
      id: 'language', label: say('language'), value: language,
      options: Object.entries(LANGUAGES).map(([tag, { name }]) => ({ value: tag, label: name })),
      onchange: (tag) => app.speak(tag),
    }),
    button(say('undo'), () => app.store.undo(), { id: 'undo', disabled: !app.store.canUndo() }),
  ];
}

function undoByKeyboard(app, event) {
  const typing = event.target.matches('input[type=text], input[type=number], input[type=date], textarea');
  if (typing || event.key.toLowerCase() !== 'z' || !(event.ctrlKey || event.metaKey) || event.shiftKey) return;
  event.preventDefault();
  app.store.undo();
}

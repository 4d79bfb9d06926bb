/** Register: a spreadsheet becomes a cohort that its owner can vouch for. */
import { button } from '../parts/choices.js';
import { h } from '../parts/element.js';
import { live } from '../parts/live.js';
import { closingBlock } from './register/closing.js';
import { columnsBlock } from './register/columns.js';
import { findingsBlock } from './register/findings.js';
import { meaningsBlock, sexesBlock } from './register/meanings.js';
import { openingBlock } from './register/opening.js';
import { profileBlock } from './register/profile.js';
import { makeReader } from './register/reader.js';
import { settingsBlock } from './register/settings.js';
import { silentLossesBlock } from './register/silent_losses.js';
import { sourceBlock } from './register/source.js';
import { spellingsBlock } from './register/spellings.js';
import { traceBlock } from './register/trace.js';
import { understoodBlock } from './register/understood.js';

/** @param {import('../app.js').App} app */
export function registerPlace(app) {
  const reader = makeReader(app);
  return live(app, (state) => Boolean(state.source), (state) => {
    const { say } = app.words;
    const heading = h('h1', {}, say('register-title'));
    if (!state.source) return [heading, h('p', {}, say('register-lead')), openingBlock(app, reader), example(app)];
    return [
      heading,
      sourceBlock(app, reader),
      settingsBlock(app),
      columnsBlock(app),
      meaningsBlock(app),
      sexesBlock(app),
      closingBlock(app),
      understoodBlock(app),
      silentLossesBlock(app),
      spellingsBlock(app),
      findingsBlock(app),
      profileBlock(app),
      traceBlock(app),
      h('section', { 'aria-labelledby': 'register-other' },
        h('h2', { id: 'register-other' }, say('register-other-title')),
        openingBlock(app, reader),
        h('p', {}, button(say('forget'), () => reader.forget(), { id: 'forget', class: 'plain' }), ' ', say('forget-meaning'))),
    ];
  });
}

/** What kind of list is wanted, shown before there is one. */
function example(app) {
  const { say } = app.words;
  const columns = ['number', 'start', 'end', 'outcome', 'sex', 'group'];
  return h('section', { 'aria-labelledby': 'register-example' },
    h('h2', { id: 'register-example' }, say('register-example-title')),
    h('p', {}, say('register-example-lead')),
    h('div', { class: 'scroll', tabindex: 0, role: 'region', 'aria-label': say('register-example-title') },
      h('table', {},
        h('caption', {}, say('register-example-caption')),
        h('thead', {}, h('tr', {}, columns.map((name) => h('th', { scope: 'col', class: 'text' }, say(`register-example-${name}`))))),
        h('tbody', {}, [1, 2, 3].map((row) =>
          h('tr', {}, columns.map((name) => h('td', { class: 'text' }, say(`register-example-${name}-${row}`)))))))));
}

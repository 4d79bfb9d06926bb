/** Fill a form with invented numbers, or empty it. */
import { button } from '../../parts/choices.js';
import { h } from '../../parts/element.js';

/**
 * @param {import('../../app.js').App} app
 * @param {string} part of the store's counts
 * @param {object} example
 * @param {object} empty
 */
export function exampleButtons(app, part, example, empty) {
  const { say } = app.words;
  const put = (value) => app.store.amend('counts', { [part]: value });
  return h('p', { class: 'actions' },
    button(say('counts-example'), () => put(example), { class: 'plain', id: `${part}-example` }),
    button(say('counts-clear'), () => put(empty), { class: 'plain', id: `${part}-clear` }));
}

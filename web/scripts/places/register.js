import { h } from '../parts/element.js';
import { live } from '../parts/live.js';

/** @param {import('../app.js').App} app */
export function registerPlace(app) {
  return live(app, () => null, () => [h('h1', {}, app.words.say('register-title'))]);
}

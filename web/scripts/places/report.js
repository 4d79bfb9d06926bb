import { h } from '../parts/element.js';
import { live } from '../parts/live.js';

/** @param {import('../app.js').App} app */
export function reportPlace(app) {
  return live(app, () => null, () => [h('h1', {}, app.words.say('report-title'))]);
}

/** From counts: the same methods for someone who has only totals. Needs no file. */
import { h } from '../parts/element.js';
import { live } from '../parts/live.js';
import { balancePart } from './counts/balance.js';
import { districtPart } from './counts/district.js';
import { lifeTablePart } from './counts/life_table.js';
import { planningPart } from './counts/planning.js';
import { strataPart } from './counts/strata.js';

/** @param {import('../app.js').App} app */
export function countsPlace(app) {
  return live(app, () => null, () => [
    h('h1', {}, app.words.say('counts-title')),
    h('p', {}, app.words.say('counts-lead')),
    lifeTablePart(app),
    strataPart(app),
    balancePart(app),
    districtPart(app),
    planningPart(app),
  ]);
}

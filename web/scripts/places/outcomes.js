/** Outcomes: what became of the patients. */
import { h } from '../parts/element.js';
import { live } from '../parts/live.js';
import { noRegister, questionChoices } from '../parts/question.js';
import { leavingBlock } from './outcomes/leaving.js';
import { lifeTableBlock } from './outcomes/life_table.js';
import { meanTimeBlock } from './outcomes/mean_time.js';
import { ratesBlock } from './outcomes/rates.js';
import { survivalBlock } from './outcomes/survival.js';
import { tippingBlock } from './outcomes/tipping.js';

/** @param {import('../app.js').App} app */
export function outcomesPlace(app) {
  return live(app, (state) => Boolean(state.cohort), (state) => {
    const heading = h('h1', {}, app.words.say('outcomes-title'));
    if (!state.cohort) return [heading, noRegister(app)];
    return [
      heading,
      h('p', {}, app.words.say('outcomes-lead')),
      questionChoices(app, { place: 'outcomes' }),
      survivalBlock(app),
      lifeTableBlock(app),
      leavingBlock(app),
      tippingBlock(app),
      ratesBlock(app),
      meanTimeBlock(app),
    ];
  });
}

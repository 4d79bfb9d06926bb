/** Caseload: how many will be under care in the coming years, and what that takes. */
import { h } from '../parts/element.js';
import { live } from '../parts/live.js';
import { noRegister } from '../parts/question.js';
import { breakEvenBlock } from './caseload/break_even.js';
import { historyBlock } from './caseload/history.js';
import { leversBlock } from './caseload/levers.js';
import { projectionBlock } from './caseload/projection.js';
import { resourcesBlock } from './caseload/resources.js';
import { scenarioFile } from './caseload/scenario_file.js';
import { backTestBlock, partsBlock } from './caseload/trust.js';

/** @param {import('../app.js').App} app */
export function caseloadPlace(app) {
  return live(app, (state) => Boolean(state.cohort), (state) => {
    const heading = h('h1', {}, app.words.say('caseload-title'));
    if (!state.cohort) return [heading, noRegister(app)];
    return [
      heading, h('p', {}, app.words.say('caseload-lead')),
      historyBlock(app), projectionBlock(app), backTestBlock(app), partsBlock(app), resourcesBlock(app), leversBlock(app), breakEvenBlock(app), scenarioFile(app),
    ];
  });
}

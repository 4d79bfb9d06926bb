/** Compare: whether one group did better, and how far one may believe it. */
import { choiceRow, selectOne } from '../parts/choices.js';
import { h } from '../parts/element.js';
import { live } from '../parts/live.js';
import { noRegister, questionChoices } from '../parts/question.js';
import { levelName } from '../parts/said.js';
import { alikeBlock } from './compare/alike.js';
import { competingBlock } from './compare/competing.js';
import { coxBlock } from './compare/cox.js';
import { differenceBlock } from './compare/difference.js';
import { intervalsBlock } from './compare/intervals.js';
import { pairOf } from './compare/pair.js';
import { timingChoices } from './compare/timing.js';
import { rankTestBlock } from './compare/rank_test.js';

/** @param {import('../app.js').App} app */
export function comparePlace(app) {
  return live(app, (state) => Boolean(state.cohort), (state) => {
    const heading = h('h1', {}, app.words.say('compare-title'));
    if (!state.cohort) return [heading, noRegister(app)];
    return [
      heading,
      h('p', {}, app.words.say('compare-lead')),
      questionChoices(app, { place: 'compare', groupRequired: true }),
      pairChoices(app),
      timingChoices(app),
      alikeBlock(app),
      differenceBlock(app),
      rankTestBlock(app),
      intervalsBlock(app),
      coxBlock(app),
      competingBlock(app),
    ];
  });
}

/** Which two groups stand against each other where only two can. */
function pairChoices(app) {
  return live(app, (state) => [state.question.group, state.compare.exposed, state.compare.reference, state.cohort?.serial], (state) => {
    const pair = pairOf(state);
    if (!pair) return [];
    const { say } = app.words;
    const select = (id, value) => selectOne({
      id: `compare-${id}`, label: say(`compare-${id}`), value,
      options: pair.levels.map((level) => ({ value: level, label: levelName(app, pair.group, level) })),
      onchange: (level) => app.store.amend('compare', { exposed: pair.exposed, reference: pair.reference, [id]: level }),
    });
    return [choiceRow(select('exposed', pair.exposed), select('reference', pair.reference))];
  });
}

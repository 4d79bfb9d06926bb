/** The actuarial life table by year, quarter or month. */
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, selectOne } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { lifeTable } from '../../parts/life_table.js';
import { live } from '../../parts/live.js';
import { cautionList, levelName } from '../../parts/said.js';

const STEPS = ['year', 'quarter', 'month'];

/** @param {import('../../app.js').App} app */
export function lifeTableBlock(app) {
  return answerBlock(app, {
    id: 'life-table',
    title: 'life-table-title',
    choices: stepChoice(app),
    ask: ({ cohort, question, outcomes }) => cohort && {
      task: 'outcomes.life_table',
      request: { interest: question.interest, group: question.group, step: outcomes.step },
    },
    draw: (answer, { question }) => [
      ...answer.tables.map(({ level, rows }) => lifeTable(app, {
        name: `life-table${level === null ? '' : `-${level}`}`,
        caption: caption(app, level, question.group),
        rows, step: answer.step,
      })),
      cautionList(app, answer.cautions),
      h('p', { class: 'method' }, app.words.say('life-table-method')),
    ],
  });
}

function caption(app, level, group) {
  const { say } = app.words;
  return level === null ? say('life-table-caption') : say('life-table-caption-group', { group: levelName(app, group, level) });
}

function stepChoice(app) {
  return live(app, (state) => state.outcomes.step, (state) => [choiceRow(selectOne({
    id: 'outcomes-step', label: app.words.say('life-table-step'), value: state.outcomes.step,
    options: STEPS.map((step) => ({ value: step, label: app.words.say(`step-${step}`) })),
    onchange: (step) => app.store.amend('outcomes', { step }),
  }))]);
}

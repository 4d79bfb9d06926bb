/** The actuarial life table by year, quarter or month. */
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, selectOne } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { lifeTable } from '../../parts/life_table.js';
import { live } from '../../parts/live.js';
import { cautionList, levelName } from '../../parts/said.js';

/** @param {import('../../app.js').App} app */
export function lifeTableBlock(app) {
  return h('div', {},
    answerBlock(app, {
      id: 'life-table',
      title: 'life-table-title',
      ask: ({ cohort, question, outcomes }) => cohort && {
        task: 'outcomes.life_table',
        request: { interest: question.interest, group: question.group, step: outcomes.step },
      },
      draw: (answer, { question }) => [
        ...answer.tables.map(({ level, rows }) => lifeTable(app, {
          name: `life-table${level === null ? '' : `-${level}`}`,
          caption: level === null ? app.words.say('life-table-caption') : app.words.say('life-table-caption-group', { group: levelName(app, question.group, level) }),
          rows, step: answer.step,
        })),
        cautionList(app, answer.cautions),
        h('p', { class: 'method' }, app.words.say('life-table-method')),
      ],
    }),
    live(app, (state) => state.outcomes.step, (state) => [choiceRow(selectOne({
      id: 'outcomes-step', label: app.words.say('life-table-step'), value: state.outcomes.step,
      options: ['year', 'quarter', 'month'].map((step) => ({ value: step, label: app.words.say(`step-${step}`) })),
      onchange: (step) => app.store.amend('outcomes', { step }),
    }))]));
}

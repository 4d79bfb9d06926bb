/** The question that Outcomes and Compare share: which endings count, and by which groups. */
import { choiceRow, selectOne, tickSeveral } from './choices.js';
import { h } from './element.js';
import { live } from './live.js';
import { covariateName } from './said.js';

/** Endings a person can be interested in: all but being under care. */
export const ENDINGS = ['died_of_disease', 'died_of_other_cause', 'died_cause_unknown', 'recovered', 'moved_away', 'lost', 'stopped'];

/**
 * @param {import('../app.js').App} app
 * @param {{ place: string, groupRequired?: boolean }} where `place` makes the ids unique
 */
export function questionChoices(app, { place, groupRequired = false }) {
  return live(app, (state) => [state.question, state.cohort?.serial], (state) => {
    const { say } = app.words;
    const groups = groupings(state).map(({ id }) => ({ value: id, label: covariateName(app, id) }));
    return [choiceRow(
      tickSeveral({
        id: `${place}-interest`, legend: say('question-interest'), hint: say('question-interest-hint'),
        options: ENDINGS.map((meaning) => ({ value: meaning, label: say(`meaning-${meaning}`) })),
        values: state.question.interest,
        onchange: (interest) => app.store.amend('question', { interest }),
      }),
      selectOne({
        id: `${place}-group`, label: say('question-group'), value: state.question.group ?? '',
        options: [{ value: '', label: say(groupRequired ? 'choose' : 'question-no-group') }, ...groups],
        onchange: (group) => app.store.amend('question', { group: group || null }),
      }),
    )];
  });
}

/** Covariates that can form groups. @param {import('../store.js').State} state */
export function groupings(state) {
  return (state.cohort?.covariates ?? []).filter((covariate) => covariate.kind === 'categorical' && covariate.levels.length > 1);
}

/** What a place shows before a register is open. @param {import('../app.js').App} app */
export function noRegister(app) {
  return h('p', { class: 'empty' }, app.words.say('no-register-yet'), ' ',
    h('a', { href: '#register' }, app.words.say('place-register')), ' · ',
    h('a', { href: '#counts' }, app.words.say('place-counts')));
}

/** "alive" when every death and nothing else counts as the outcome, "free" otherwise; keys of sentences use it. */
export function kindOfOutcome(interest) {
  const deaths = ENDINGS.slice(0, 3);
  return interest.length === 3 && deaths.every((death) => interest.includes(death)) ? 'deaths' : 'other';
}

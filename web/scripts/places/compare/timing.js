/** When the group was known: a group that had to be lived into cannot be compared from the start. */
import { choiceRow, numberField, selectOne } from '../../parts/choices.js';
import { live } from '../../parts/live.js';
import { pairOf } from './pair.js';

/** What the choices stand for in a request. @type {Map<boolean|null, string>} */
const FOUND = new Map([[null, ''], [true, 'alike'], [false, 'differently']]);

/** @param {import('../../app.js').App} app */
export function timingChoices(app) {
  return live(app, (state) => [state.question.group, state.compare.known, state.compare.landmarkMonths, state.compare.foundAlike, state.cohort?.serial], (state) => {
    if (!pairOf(state)) return [];
    const { say } = app.words;
    const { known, landmarkMonths, foundAlike } = state.compare;
    return [choiceRow(
      selectOne({
        id: 'compare-known', label: say('compare-known'), hint: say('compare-known-hint'), value: known ?? '',
        options: ['', 'start', 'later'].map((value) => ({ value, label: say(value ? `compare-known-${value}` : 'choose') })),
        onchange: (value) => app.store.amend('compare', { known: value || null }),
      }),
      known === 'later' ? numberField({
        id: 'compare-landmark', label: say('compare-landmark'), hint: say('compare-landmark-hint'), value: landmarkMonths,
        least: 0.1, greatest: 600, fault: landmarkMonths !== null && !(landmarkMonths > 0) ? say('fault-not-positive') : null,
        onchange: (months) => app.store.amend('compare', { landmarkMonths: months }),
      }) : null,
      selectOne({
        id: 'compare-found', label: say('compare-found'), hint: say('compare-found-hint'), value: FOUND.get(foundAlike),
        options: [...FOUND.values()].map((value) => ({ value, label: say(value ? `compare-found-${value}` : 'choose') })),
        onchange: (value) => app.store.amend('compare', { foundAlike: [...FOUND.keys()].find((alike) => FOUND.get(alike) === value) }),
      }))];
  });
}

/** The model in form controls: which covariates, against which reference, per how much. */
import { choiceRow, numberField, selectOne, tickSeveral } from '../../parts/choices.js';
import { live } from '../../parts/live.js';
import { covariateName, levelName } from '../../parts/said.js';
import { pairOf, timingOf } from './pair.js';

const MOST_LEVELS = 20;
const YEARS_OF_AGE = 10;

/** Covariates a model can take: numbers, and columns with a few categories. */
function usable(state) {
  return (state.cohort?.covariates ?? []).filter(({ kind, levels }) => kind === 'numeric' || (levels.length > 1 && levels.length <= MOST_LEVELS));
}

/** The chosen covariates that the register still has; the compared group goes in until something is chosen. */
function chosen(state) {
  const known = new Map(usable(state).map((covariate) => [covariate.id, covariate]));
  const picked = state.compare.covariates.filter(({ id }) => known.has(id));
  const group = known.get(state.question.group);
  return picked.length || !group ? picked : [withDefaults(state, group)];
}

function withDefaults(state, covariate) {
  if (covariate.kind === 'numeric') return { id: covariate.id, reference: null, per: covariate.id === 'age' ? YEARS_OF_AGE : 1 };
  const pair = pairOf(state);
  const largest = covariate.levels.reduce((a, b) => (b.n > a.n ? b : a)).level;
  return { id: covariate.id, reference: pair?.group === covariate.id ? pair.reference : largest, per: 1 };
}

/** A covariate as it was chosen already, or with what suits it to begin with. */
function pick(state, id) {
  return chosen(state).find((each) => each.id === id) ?? withDefaults(state, usable(state).find((each) => each.id === id));
}

/** @param {import('../../store.js').State} state */
export function coxRequest(state) {
  const covariates = chosen(state);
  if (!state.cohort || covariates.length === 0) return null;
  // The compared group comes first: it is what the question is about.
  const ordered = [...covariates].sort((one, other) => Number(other.id === state.question.group) - Number(one.id === state.question.group));
  return { task: 'compare.cox', request: { interest: state.question.interest, covariates: ordered, ties: state.compare.ties, timing: timingOf(state) } };
}

/** @param {import('../../app.js').App} app */
export function covariateChoices(app) {
  return live(app, (state) => [state.compare, state.question.group, state.cohort?.serial], (state) => {
    const { say } = app.words;
    const now = chosen(state);
    const change = (covariates) => app.store.amend('compare', { covariates });
    const ticks = tickSeveral({
      id: 'cox-covariates', legend: say('cox-covariates'), hint: say('cox-covariates-hint'),
      options: usable(state).map(({ id }) => ({ value: id, label: covariateName(app, id) })),
      values: now.map(({ id }) => id),
      onchange: (ids) => change(ids.map((id) => pick(app.store.state, id))),
    });
    const details = now.map((picked) => detail(app, state, picked, (patch) =>
      change(chosen(app.store.state).map((each) => (each.id === picked.id ? { ...each, ...patch } : each)))));
    const ties = selectOne({
      id: 'cox-ties', label: say('cox-ties'), value: state.compare.ties,
      options: ['efron', 'breslow'].map((rule) => ({ value: rule, label: say(`cox-ties-${rule}`) })),
      onchange: (rule) => app.store.amend('compare', { ties: rule }),
    });
    return [ticks, choiceRow(...details, ties)];
  });
}

/** The reference category, or the step of a number. */
function detail(app, state, picked, change) {
  const { say } = app.words;
  const covariate = usable(state).find(({ id }) => id === picked.id);
  const name = covariateName(app, picked.id);
  if (covariate.kind === 'numeric') {
    return numberField({
      id: `cox-per-${picked.id}`, label: say('cox-per', { covariate: name }), value: picked.per, least: 0,
      onchange: (per) => change({ per: per > 0 ? per : 1 }),
    });
  }
  return selectOne({
    id: `cox-reference-${picked.id}`, label: say('cox-reference', { covariate: name }), value: picked.reference,
    options: covariate.levels.map(({ level }) => ({ value: level, label: levelName(app, picked.id, level) })),
    onchange: (reference) => change({ reference }),
  });
}

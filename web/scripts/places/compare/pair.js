/** The two groups that are compared, chosen or, until then, the two with the most patients. */
import { DAYS_PER_YEAR } from '../../units.js';

/**
 * @param {import('../../store.js').State} state
 * @returns {{ group: string, levels: string[], exposed: string, reference: string } | null}
 */
export function pairOf({ question, cohort, compare }) {
  const covariate = cohort?.covariates.find((each) => each.id === question.group);
  if (!covariate || covariate.levels.length < 2) return null;
  const levels = covariate.levels.map(({ level }) => level);
  const byNumber = [...covariate.levels].sort((a, b) => b.n - a.n).map(({ level }) => level);
  const reference = levels.includes(compare.reference) ? compare.reference : byNumber[0];
  const exposed = levels.includes(compare.exposed) ? compare.exposed : byNumber.find((level) => level !== reference);
  return { group: covariate.id, levels, exposed, reference };
}

/** The part of a request that names the two groups, or null. */
export function pairRequest(state) {
  const pair = pairOf(state);
  return pair && {
    interest: state.question.interest, group: pair.group, exposed: pair.exposed, reference: pair.reference, timing: timingOf(state),
  };
}

/** When the groups became known, as the engine asks for it. @param {import('../../store.js').State} state */
export function timingOf({ compare: { known, landmarkMonths, foundAlike } }) {
  const landmark = known === 'later' && landmarkMonths > 0;
  return { known, landmark_days: landmark ? Math.max(1, Math.round(landmarkMonths * DAYS_PER_YEAR / 12)) : null, found_alike: foundAlike };
}

/** What every question about the coming years is asked with. */

const DRAWS = 1000;
const SEED = 1;
export const FARTHEST = 30;

/**
 * The setting that is chosen, or null while it cannot be asked with.
 * @param {import('../../store.js').State} state
 */
export function setting({ cohort, caseload }) {
  if (!cohort) return null;
  const { years, basis, perYear } = caseload;
  if (!yearsAreFine(years) || (basis === 'typed' && !(perYear >= 0 && perYear !== null))) return null;
  return { years, newcomers: { basis, per_year: basis === 'typed' ? perYear : null }, draws: DRAWS, seed: SEED };
}

/** @param {import('../../store.js').State} state */
export function projectionRequest(state) {
  const request = setting(state);
  return request && { task: 'caseload.project', request };
}

export function yearsAreFine(years) {
  return Number.isInteger(years) && years >= 1 && years <= FARTHEST;
}

/** What every question about the coming years is asked with. */

const DRAWS = 2000;
const SEED = 1;
export const FARTHEST = 30;

export const BASES = ['history', 'trend', 'typed', 'incidence'];
export const TAILS = ['held', 'halved', 'doubled', 'nobody'];
const MOST_GROWTH = 50;
const MOST_INCIDENCE = 100_000;

const within = (value, least, greatest) => value !== null && value >= least && value <= greatest;

/**
 * What is wrong with the setting, by field; each is [key of a sentence, its parameters].
 * @param {import('../../store.js').State['caseload']} caseload
 */
export function settingFaults({ years, basis, perYear, incidence, growth, damping, completeness }) {
  /** @type {Record<string, [string, object]>} */
  const found = {};
  if (!yearsAreFine(years)) found.years = ['fault-whole-between', { least: 1, greatest: FARTHEST }];
  if (basis === 'typed' && perYear !== null && perYear < 0) found.perYear = ['fault-negative', {}];
  if (basis === 'incidence' && incidence !== null && !within(incidence, 0, MOST_INCIDENCE)) found.incidence = ['fault-between', { least: 0, greatest: MOST_INCIDENCE }];
  if ((basis === 'typed' || basis === 'incidence') && !within(growth, -MOST_GROWTH, MOST_GROWTH)) found.growth = ['fault-between', { least: -MOST_GROWTH, greatest: MOST_GROWTH }];
  if (basis === 'trend' && !within(damping, 0, 1)) found.damping = ['fault-between', { least: 0, greatest: 1 }];
  if (!within(completeness, 1, 100)) found.completeness = ['fault-between', { least: 1, greatest: 100 }];
  return found;
}

/**
 * The setting that is chosen, or null while it cannot be asked with.
 * @param {import('../../store.js').State} state
 */
export function setting({ cohort, caseload }) {
  if (!cohort || Object.keys(settingFaults(caseload)).length) return null;
  const { years, basis, perYear, incidence, population, growth, damping, completeness, tail } = caseload;
  if (basis === 'typed' && perYear === null) return null;
  if (basis === 'incidence' && (incidence === null || population === null)) return null;
  /** @type {Record<string, object>} */
  const newcomers = {
    history: {}, trend: { damping }, typed: { per_year: perYear, growth_percent: growth },
    incidence: { incidence, population, growth_percent: growth },
  };
  return { years, newcomers: { basis, ...newcomers[basis] }, completeness, tail, draws: DRAWS, seed: SEED };
}

/** @param {import('../../store.js').State} state */
export function projectionRequest(state) {
  const request = setting(state);
  return request && { task: 'caseload.project', request };
}

function yearsAreFine(years) {
  return Number.isInteger(years) && years >= 1 && years <= FARTHEST;
}

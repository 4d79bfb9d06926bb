/** The one question behind projection, what-if and resources: asked once, drawn three times. */

const DRAWS = 1000;
const SEED = 1;

/** @param {import('../../store.js').State} state */
export function projectionRequest({ cohort, caseload }) {
  if (!cohort) return null;
  const { years, basis, perYear, resources, whatIf } = caseload;
  if (basis === 'typed' && perYear === null) return null;
  const { on, ...change } = whatIf;
  return {
    task: 'caseload.project',
    request: {
      years,
      newcomers: { basis, per_year: basis === 'typed' ? perYear : null },
      resources,
      what_if: on ? { ...change, from_year: Math.min(change.from_year, years) } : null,
      draws: DRAWS,
      seed: SEED,
    },
  };
}

/** Mantel-Haenszel figures pooled over strata, with whether pooling is fair; registers and typed counts share it. */
import { h } from './element.js';
import { table } from './table.js';

/**
 * @param {import('../app.js').App} app
 * @param {{ name: string, pooled: any, crude?: any, homogeneity: any, names: {exposed: string, reference: string} }} figures
 */
export function pooledTable(app, { name, pooled, crude, homogeneity, names }) {
  const { say, ratio, points, estimate, decimal, pValue } = app.words;
  if (!pooled) return null;
  const rows = [
    { label: say('risk-ratio'), key: 'risk_ratio', write: ratio },
    { label: say('odds-ratio'), key: 'odds_ratio', write: ratio },
    { label: say('risk-difference'), key: 'risk_difference', write: points },
  ];
  const column = (figures) => ({ show: (row) => estimate(figures[row.key], row.write), full: (row) => figures[row.key]?.value });
  const fair = homogeneity?.breslow_day_tarone;
  return h('div', {},
    h('p', { class: 'sentence' }, say('pooled-sentence', {
      ...names, ratio: ratio(pooled.risk_ratio?.value),
      interval: say('from-to', { lower: ratio(pooled.risk_ratio?.lower), upper: ratio(pooled.risk_ratio?.upper) }),
      p: pValue(pooled.p),
    })),
    h('p', {}, say('odds-are-not-risks')),
    table(app, {
      name, caption: say('pooled-caption'), rows,
      columns: [
        { heading: say('measure'), show: (row) => row.label, text: true },
        ...(crude ? [{ heading: say('crude'), ...column(crude) }] : []),
        { heading: say('pooled'), ...column(pooled) },
      ],
    }),
    fair && h('p', {}, say(fair.p < 0.05 ? 'strata-differ' : 'strata-agree', { chi: decimal(fair.chi_squared, 2), df: fair.df, p: pValue(fair.p) })));
}

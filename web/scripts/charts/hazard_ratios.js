/** Hazard ratios with their limits on a logarithmic scale, one line each, the value 1 marked. */
import * as Plot from '@observablehq/plot';
import { FAINT_RULE, INK, SOFT_INK, TEXT_SIZE, plateStyle } from './series.js';

const ROW = 44;
const MARGIN = 14;

/**
 * @param {Array<{label: string, hazard_ratio: {value: number, lower: number, upper: number}}>} terms
 * @param {{ width: number, words: ReturnType<typeof import('../words.js').wordsIn> }} options
 */
export function hazardRatios(terms, { width, words }) {
  const rows = terms.map(({ label, hazard_ratio: { value, lower, upper } }, row) => ({ label, value, lower, upper, row }));
  const ends = rows.flatMap(({ lower, upper }) => [lower, upper]).filter((end) => end > 0 && Number.isFinite(end));
  const least = Math.min(0.5, ...ends);
  const greatest = Math.max(2, ...ends);
  return Plot.plot({
    ...plateStyle(width),
    height: rows.length * ROW + 52,
    marginLeft: MARGIN,
    marginRight: MARGIN + 10,
    marginTop: 4,
    marginBottom: 48,
    x: { type: 'log', domain: [least / 1.1, greatest * 1.1], label: null },
    y: { domain: [-0.75, rows.length - 0.4], reverse: true, axis: null },
    marks: [
      Plot.gridX({ ticks: ratioTicks(least, greatest), stroke: FAINT_RULE, strokeOpacity: 1 }),
      Plot.ruleX([1], { stroke: INK }),
      Plot.ruleY(rows, { y: 'row', x1: 'lower', x2: 'upper', stroke: INK, strokeWidth: 1.6 }),
      Plot.dot(rows, { y: 'row', x: 'value', r: 4.5, fill: '#0b5563', symbol: 'square' }),
      Plot.text(rows, {
        y: 'row', text: 'label', frameAnchor: 'left', textAnchor: 'start', dy: -TEXT_SIZE - 4, fill: INK, fontWeight: 600,
        stroke: 'white', strokeWidth: 6,
      }),
      Plot.axisX({ ticks: ratioTicks(least, greatest), tickFormat: (value) => words.amount(value), tickSize: 4 }),
      Plot.text([words.say('axis-hazard-ratio')], { frameAnchor: 'bottom', dy: 38, fill: SOFT_INK }),
    ],
  });
}

/** Round ratios inside the range. */
function ratioTicks(least, greatest) {
  return [0.01, 0.02, 0.05, 0.1, 0.2, 0.5, 1, 2, 5, 10, 20, 50, 100].filter((tick) => tick >= least / 1.1 && tick <= greatest * 1.1);
}

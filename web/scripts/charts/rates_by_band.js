/** Rates in bands of time with their limits, groups side by side within a band. */
import * as Plot from '@observablehq/plot';
import { FAINT_RULE, INK, SOFT_INK, plateStyle, seriesStyle } from './series.js';

const SYMBOLS = ['circle', 'square', 'triangle', 'diamond', 'star', 'cross'];
const ROOM_FOR_BAND = 44;

/**
 * @param {{ bands: string[], points: Array<{band: number, group: number, value: number, lower: number, upper: number}>, groups: string[] }} data
 * @param {{ width: number, words: ReturnType<typeof import('../words.js').wordsIn>, label: string }} options
 */
export function ratesByBand({ bands, points, groups }, { width, words, label }) {
  const shift = 0.6 / Math.max(1, groups.length);
  const placed = points.map((point) => ({ ...point, x: point.band + (point.group - (groups.length - 1) / 2) * shift }));
  const every = Math.max(1, Math.ceil((bands.length * ROOM_FOR_BAND) / (width - 60)));
  // An upper limit from a handful of days would flatten everything else: the axis ends a little above the values.
  const highest = Math.max(...placed.map(({ value }) => value), ...placed.map(({ value, upper }) => Math.min(upper, value * 3)), 1e-9);
  const top = highest * 1.08;
  return Plot.plot({
    ...plateStyle(width),
    height: 260,
    marginLeft: 48,
    marginBottom: 44,
    marginTop: 14,
    x: { domain: [-0.6, bands.length - 0.4], label: null },
    y: { domain: [0, top], label: null },
    marks: [
      Plot.gridY({ ticks: 5, stroke: FAINT_RULE, strokeOpacity: 1 }),
      Plot.axisY({ ticks: 5, tickSize: 0, tickFormat: (value) => words.amount(value) }),
      Plot.axisX({ ticks: bands.map((_, i) => i).filter((i) => i % every === 0), tickFormat: (i) => bands[i] ?? '', tickSize: 0 }),
      Plot.ruleX(placed, { x: 'x', y1: 'lower', y2: (point) => Math.min(point.upper, top), stroke: ({ group }) => seriesStyle(group).stroke, strokeWidth: 1.4 }),
      Plot.dot(placed, { x: 'x', y: 'value', r: 4, symbol: ({ group }) => SYMBOLS[group % SYMBOLS.length], fill: ({ group }) => seriesStyle(group).stroke }),
      Plot.ruleY([0], { stroke: INK }),
      Plot.text([label], { frameAnchor: 'bottom', dy: 36, fill: SOFT_INK }),
    ],
  });
}

/** The mark of a group, to be written beside its name. @param {number} group */
export function markOf(group) {
  return ['●', '■', '▲', '◆', '★', '✚'][group % SYMBOLS.length];
}

/** Counts by month, by day of the month or by last digit, with what would be expected where that is known. */
import * as Plot from '@observablehq/plot';
import { FAINT_RULE, INK, plateStyle } from './series.js';

const ACCENT = '#0b5563';
const ROOM_FOR_LABEL = 46;

/**
 * @param {{ bars: Array<{label: string, count: number, expected?: number}>, named?: (label: string) => boolean }} data
 *   `named` tells which bars carry their label; by default as many as there is room for
 * @param {{ width: number, words: ReturnType<typeof import('../words.js').wordsIn>, roomForLabel?: number }} options
 */
export function countedBars({ bars, named }, { width, words, roomForLabel = ROOM_FOR_LABEL }) {
  const wanted = bars.map(({ label }) => label).filter((label) => !named || named(label));
  const every = Math.max(1, Math.ceil((wanted.length * roomForLabel) / (width - 60)));
  const expected = bars.filter((bar) => bar.expected !== undefined);
  const most = Math.max(1, ...bars.map((bar) => Math.max(bar.count, bar.expected ?? 0)));
  return Plot.plot({
    ...plateStyle(width),
    height: 210,
    marginLeft: 44,
    marginTop: 14,
    x: { type: 'band', label: null, domain: bars.map(({ label }) => label), ticks: wanted.filter((_, i) => i % every === 0), padding: bars.length > 60 ? 0.1 : 0.25 },
    y: { label: null, domain: [0, most * 1.05] },
    marks: [
      Plot.gridY({ ticks: 4, stroke: FAINT_RULE, strokeOpacity: 1 }),
      Plot.axisY({ tickSize: 0, ticks: 4, tickFormat: (n) => words.count(n) }),
      Plot.barY(bars, { x: 'label', y: 'count', fill: ACCENT }),
      Plot.tickY(expected, { x: 'label', y: 'expected', stroke: INK, strokeWidth: 2 }),
      Plot.ruleY([0], { stroke: INK }),
    ],
  });
}

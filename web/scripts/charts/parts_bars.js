/** Shares of a whole, one bar for each year, the parts named above the first bar's stretch of the legend. */
import * as Plot from '@observablehq/plot';
import { INK, SOFT_INK, TEXT_SIZE, plateStyle, seriesFill } from './series.js';

const LABEL_ROOM = 150;
const FILLS = [0, 2, 4];

/**
 * @param {Array<Record<string, number>>} years shares by part, adding up to 1
 * @param {Array<{part: string, label: string}>} parts from the bottom up
 * @param {{ width: number, words: ReturnType<typeof import('../words.js').wordsIn> }} options
 */
export function partsBars(years, parts, { width, words }) {
  const stacked = years.flatMap((shares, i) => {
    let from = 0;
    return parts.map(({ part }, k) => {
      const bar = { year: i + 1, from, to: from + shares[part], fill: seriesFill(FILLS[k]) };
      from = bar.to;
      return bar;
    });
  });
  const last = years.at(-1);
  const height = Math.min(320, Math.max(230, width * 0.42));
  let reached = 0;
  const labels = parts.map(({ part, label }) => {
    const middle = reached + last[part] / 2;
    reached += last[part];
    return { label, middle };
  });
  const room = Math.min(LABEL_ROOM, width * 0.38);
  return Plot.plot({
    ...plateStyle(width),
    height,
    marginLeft: 48, marginRight: room, marginTop: 12, marginBottom: 44,
    x: { domain: [0.5, years.length + 0.5], label: null },
    y: { domain: [0, 1], label: null },
    marks: [
      Plot.rectY(stacked, { x1: (bar) => bar.year - 0.38, x2: (bar) => bar.year + 0.38, y1: 'from', y2: 'to', fill: 'fill', stroke: 'white', strokeWidth: 1 }),
      Plot.axisY({ ticks: [0, 0.25, 0.5, 0.75, 1], tickSize: 0, tickFormat: (share) => words.percent(share, 0) }),
      Plot.axisX({ ticks: years.map((_, i) => i + 1).filter((year) => year % Math.ceil(years.length / 10) === 0), tickFormat: (year) => words.count(year), tickSize: 4 }),
      Plot.text([words.say('axis-year-ahead')], { frameAnchor: 'bottom', dy: 36, fill: SOFT_INK }),
      Plot.text(labels, {
        x: years.length + 0.5, y: 'middle', text: 'label', dx: 8, textAnchor: 'start', lineAnchor: 'middle', lineWidth: (room - 12) / (TEXT_SIZE * 1.25), fill: INK, fontWeight: 600,
      }),
      Plot.ruleY([0], { stroke: INK }),
    ],
  });
}

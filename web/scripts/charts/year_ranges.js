/** One quantity year by year: a mark at what is expected, a thick line for 80 and a thin one for 95 of 100 runs. */
import * as Plot from '@observablehq/plot';
import { FAINT_RULE, INK, SOFT_INK, plateStyle, seriesStyle } from './series.js';

/**
 * @param {Array<{ value: number, p80: [number, number], p95: [number, number] }>} bands one for each year
 * @param {{ width: number, words: ReturnType<typeof import('../words.js').wordsIn> }} options
 */
export function yearRanges(bands, { width, words }) {
  const rows = bands.map((band, i) => ({ year: i + 1, value: band.value, l80: band.p80[0], u80: band.p80[1], l95: band.p95[0], u95: band.p95[1] }));
  const highest = Math.max(...rows.map(({ u95 }) => u95)) * 1.06;
  const { stroke } = seriesStyle(0);
  return Plot.plot({
    ...plateStyle(width),
    height: Math.min(340, Math.max(240, width * 0.45)),
    marginLeft: 68, marginRight: 20, marginTop: 16, marginBottom: 44,
    x: { domain: [0.5, rows.length + 0.5], label: null },
    y: { domain: [0, highest], label: null },
    marks: [
      Plot.gridY({ ticks: 5, stroke: FAINT_RULE, strokeOpacity: 1 }),
      Plot.axisY({ ticks: 5, tickSize: 0, tickFormat: (n) => words.count(n) }),
      Plot.axisX({ ticks: rows.map(({ year }) => year).filter((year) => year % Math.ceil(rows.length / 10) === 0), tickFormat: (year) => words.count(year), tickSize: 4 }),
      Plot.text([words.say('axis-year-ahead')], { frameAnchor: 'bottom', dy: 36, fill: SOFT_INK }),
      Plot.ruleX(rows, { x: 'year', y1: 'l95', y2: 'u95', stroke, strokeWidth: 1.4 }),
      Plot.ruleX(rows, { x: 'year', y1: 'l80', y2: 'u80', stroke, strokeWidth: 5, strokeOpacity: 0.45 }),
      Plot.dot(rows, { x: 'year', y: 'value', r: 4, fill: stroke, stroke: 'white', strokeWidth: 1.2 }),
      Plot.ruleY([0], { stroke: INK }),
    ],
  });
}

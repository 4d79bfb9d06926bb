/** What would have been projected, as a fan, and what was seen, as a line with dots. */
import * as Plot from '@observablehq/plot';
import { FAINT_RULE, INK, SOFT_INK, plateStyle, seriesStyle } from './series.js';

const MONTHS_PER_YEAR = 12;

/**
 * @param {Array<{month: number, band: { value: number, p50: [number, number], p80: [number, number], p95: [number, number] }, seen: number}>} path
 * @param {{ width: number, words: ReturnType<typeof import('../words.js').wordsIn> }} options
 */
export function backTestFan(path, { width, words }) {
  const rows = path.map(({ month, band, seen }) => ({
    month, seen, value: band.value, l50: band.p50[0], u50: band.p50[1], l80: band.p80[0], u80: band.p80[1], l95: band.p95[0], u95: band.p95[1],
  }));
  const highest = Math.max(...rows.map(({ u95, seen }) => Math.max(u95, seen))) * 1.06;
  const months = rows.at(-1).month;
  const { stroke } = seriesStyle(0);
  const area = (level, fillOpacity) => Plot.areaY(rows, { x: 'month', y1: `l${level}`, y2: `u${level}`, fill: stroke, fillOpacity });
  return Plot.plot({
    ...plateStyle(width),
    height: Math.min(380, Math.max(260, width * 0.5)),
    marginLeft: 52, marginRight: 20, marginTop: 16, marginBottom: 44,
    x: { domain: [0, months], label: null },
    y: { domain: [0, highest], label: null },
    marks: [
      Plot.gridY({ ticks: 6, stroke: FAINT_RULE, strokeOpacity: 1 }),
      Plot.axisY({ tickSize: 0, ticks: 6, tickFormat: (n) => words.count(n) }),
      Plot.axisX({
        ticks: Array.from({ length: months / MONTHS_PER_YEAR + 1 }, (_, year) => year * MONTHS_PER_YEAR),
        tickFormat: (month) => words.count(month / MONTHS_PER_YEAR), tickSize: 4,
      }),
      Plot.text([words.say('axis-years-from-origin')], { frameAnchor: 'bottom', dy: 36, fill: SOFT_INK }),
      area(95, 0.1), area(80, 0.14), area(50, 0.2),
      Plot.lineY(rows, { x: 'month', y: 'value', stroke, strokeWidth: 2 }),
      Plot.lineY(rows, { x: 'month', y: 'seen', stroke: INK, strokeWidth: 1.2, strokeDasharray: '3 2' }),
      Plot.dot(rows.filter(({ month }) => month % (months > 48 ? 6 : 3) === 0), { x: 'month', y: 'seen', r: 3, fill: 'white', stroke: INK, strokeWidth: 1.6 }),
      Plot.ruleY([0], { stroke: INK }),
    ],
  });
}

/** Newcomers by calendar year; years not wholly covered are drawn hollow. */
import * as Plot from '@observablehq/plot';
import { FAINT_RULE, INK, SOFT_INK, TEXT_SIZE, plateStyle } from './series.js';

const ACCENT = '#0b5563';
const ROOM_FOR_NUMBER = 34;

/**
 * @param {{ years: Array<{year: number, count: number, whole: boolean}>, mean: number|null }} data
 * @param {{ width: number, words: ReturnType<typeof import('../words.js').wordsIn> }} options
 */
export function newcomersBars({ years, mean }, { width, words }) {
  const every = Math.max(1, Math.ceil((years.length * ROOM_FOR_NUMBER) / (width - 60)));
  const label = (bar) => words.count(bar.count);
  return Plot.plot({
    ...plateStyle(width),
    height: 240,
    marginLeft: 44,
    marginTop: 22,
    x: { type: 'band', label: null, tickFormat: (year) => String(year), ticks: years.map(({ year }) => year).filter((_, i) => i % every === 0), padding: 0.25 },
    y: { label: null, domain: [0, Math.max(1, ...years.map(({ count }) => count)) * 1.05] },
    marks: [
      Plot.gridY({ ticks: 5, stroke: FAINT_RULE, strokeOpacity: 1 }),
      Plot.axisY({ tickSize: 0, ticks: 5, tickFormat: (n) => words.count(n) }),
      Plot.barY(years.filter(({ whole }) => whole), { x: 'year', y: 'count', fill: ACCENT }),
      Plot.barY(years.filter(({ whole }) => !whole), { x: 'year', y: 'count', fill: 'none', stroke: ACCENT, strokeDasharray: '3 2' }),
      every === 1 ? Plot.text(years, { x: 'year', y: 'count', text: label, dy: -TEXT_SIZE * 0.7, fill: INK }) : [],
      Plot.ruleY([0], { stroke: INK }),
      mean === null ? [] : Plot.ruleY([mean], { stroke: SOFT_INK, strokeDasharray: '5 3' }),
    ],
  });
}

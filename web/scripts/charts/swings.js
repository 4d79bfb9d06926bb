/** What one assumption at a time does to the answer: a line from its low to its high end, the widest first. */
import * as Plot from '@observablehq/plot';
import { FAINT_RULE, INK, SOFT_INK, TEXT_SIZE, plateStyle, seriesStyle } from './series.js';

const ROW = 46;
const MARGIN = 16;

/**
 * @param {{ rows: Array<{label: string, at_low: number, at_high: number}>, value: number }} data
 * @param {{ width: number, words: ReturnType<typeof import('../words.js').wordsIn> }} options
 */
export function swings({ rows, value }, { width, words }) {
  const marked = rows.map((row, position) => ({ ...row, position }));
  const ends = [value, ...rows.flatMap(({ at_low: low, at_high: high }) => [low, high])];
  const room = (Math.max(...ends) - Math.min(...ends)) * 0.08 || 1;
  const { stroke } = seriesStyle(0);
  return Plot.plot({
    ...plateStyle(width),
    height: rows.length * ROW + 60,
    marginLeft: MARGIN, marginRight: MARGIN + 8, marginTop: 6, marginBottom: 48,
    x: { domain: [Math.min(...ends) - room, Math.max(...ends) + room], label: null },
    y: { domain: [-0.7, rows.length - 0.4], reverse: true, axis: null },
    marks: [
      Plot.gridX({ ticks: 6, stroke: FAINT_RULE, strokeOpacity: 1 }),
      Plot.ruleX([value], { stroke: INK }),
      Plot.ruleY(marked, { y: 'position', x1: 'at_low', x2: 'at_high', stroke, strokeWidth: 3 }),
      Plot.dot(marked, { y: 'position', x: 'at_low', r: 4.5, fill: 'white', stroke, strokeWidth: 2 }),
      Plot.dot(marked, { y: 'position', x: 'at_high', r: 4.5, fill: stroke, stroke }),
      Plot.text(marked, {
        y: 'position', text: 'label', frameAnchor: 'left', textAnchor: 'start', dy: -TEXT_SIZE - 5, fill: INK, fontWeight: 600, stroke: 'white', strokeWidth: 6,
      }),
      Plot.axisX({ ticks: width < 480 ? 4 : 6, tickFormat: (n) => words.count(n), tickSize: 4 }),
      Plot.text([words.say('price-per-patient-year')], { frameAnchor: 'bottom', dy: 38, fill: SOFT_INK }),
    ],
  });
}

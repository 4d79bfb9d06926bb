/** How likely each line has been passed by each month: steps from 0 to 100 %. */
import * as Plot from '@observablehq/plot';
import { FAINT_RULE, INK, SOFT_INK, TEXT_SIZE, plateStyle, seriesStyle, spreadLabels } from './series.js';

const LABEL_ROOM = 110;
const MARGINS = { left: 52, top: 16, bottom: 44 };
const MONTHS_PER_YEAR = 12;
const TICKS = [0, 0.25, 0.5, 0.75, 1];

/**
 * @param {Array<{label: string, shares: number[]}>} lines shares by month, the first month first
 * @param {{ width: number, words: ReturnType<typeof import('../words.js').wordsIn> }} options
 */
export function chanceByMonth(lines, { width, words }) {
  const height = Math.min(340, Math.max(240, width * 0.45));
  const months = lines[0].shares.length;
  const every = months / MONTHS_PER_YEAR > 10 ? 5 : 1;
  const plotHeight = height - MARGINS.top - MARGINS.bottom;
  const ends = spreadLabels(lines.map(({ label, shares }, position) => ({
    label, position, y: MARGINS.top + (1 - shares.at(-1)) * plotHeight,
  })), height - MARGINS.bottom);
  return Plot.plot({
    ...plateStyle(width),
    height,
    marginLeft: MARGINS.left, marginRight: LABEL_ROOM, marginTop: MARGINS.top, marginBottom: MARGINS.bottom,
    x: { domain: [0, months], label: null },
    y: { domain: [0, 1], label: null },
    marks: [
      Plot.gridY(TICKS, { stroke: FAINT_RULE, strokeOpacity: 1 }),
      Plot.ruleY([0.5], { stroke: SOFT_INK, strokeDasharray: '1 3' }),
      Plot.axisY({ ticks: TICKS, tickSize: 0, tickFormat: (share) => words.percent(share, 0) }),
      Plot.axisX({
        ticks: Array.from({ length: Math.floor(months / MONTHS_PER_YEAR / every) + 1 }, (_, i) => i * every * MONTHS_PER_YEAR),
        tickFormat: (month) => words.count(month / MONTHS_PER_YEAR), tickSize: 4,
      }),
      Plot.text([words.say('axis-years-from-closing')], { frameAnchor: 'bottom', dy: 36, fill: SOFT_INK }),
      lines.map(({ shares }, position) => Plot.lineY([0, ...shares].map((share, month) => ({ month, share })), {
        x: 'month', y: 'share', curve: 'step-before', strokeWidth: 2, stroke: seriesStyle(position).stroke, strokeDasharray: seriesStyle(position).dash ?? 'none',
      })),
      ends.map((end) => Plot.text([end.label], {
        frameAnchor: 'top-right', dx: 8, dy: end.y - MARGINS.top, textAnchor: 'start', lineAnchor: 'middle', lineWidth: (LABEL_ROOM - 10) / TEXT_SIZE,
        fill: seriesStyle(end.position).stroke, fontWeight: 600, textOverflow: 'ellipsis',
      })),
      Plot.ruleY([0], { stroke: INK }),
    ],
  });
}

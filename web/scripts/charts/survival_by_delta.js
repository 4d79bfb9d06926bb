/** Survival at one time over how many times the hazard of the others the lost may have had. */
import * as Plot from '@observablehq/plot';
import { FAINT_RULE, INK, SOFT_INK, TEXT_SIZE, plateStyle, seriesStyle, spreadLabels } from './series.js';

const HEIGHT = 300;
const TOP = 14;
const BOTTOM = 46;
const ROOM_FOR_LABEL = 110;

/**
 * @param {{ deltas: number[], lines: Array<{label: string, survival: Array<{value: number, lower: number, upper: number}>}> }} data
 * @param {{ width: number, words: ReturnType<typeof import('../words.js').wordsIn> }} options
 */
export function survivalByDelta({ deltas, lines }, { width, words }) {
  const points = lines.flatMap(({ survival }, line) => survival.flatMap(({ value, lower, upper }, i) =>
    (value === null ? [] : [{ line, delta: deltas[i], value, lower, upper }])));
  const inner = HEIGHT - TOP - BOTTOM;
  const named = lines.length > 1;
  const ends = lines.map(({ label, survival }, line) => ({ label, line, y: inner * (1 - (survival.at(-1).value ?? 0)) }));
  return Plot.plot({
    ...plateStyle(width),
    height: HEIGHT,
    marginLeft: 46,
    marginRight: named ? ROOM_FOR_LABEL : 16,
    marginTop: TOP,
    marginBottom: BOTTOM,
    x: { type: 'log', domain: [deltas[0], deltas.at(-1)], label: null },
    y: { domain: [0, 1], label: null },
    marks: [
      Plot.gridY({ ticks: 5, stroke: FAINT_RULE, strokeOpacity: 1 }),
      Plot.axisY({ ticks: 5, tickSize: 0, tickFormat: (share) => words.percent(share, 0) }),
      Plot.axisX({ ticks: [0.5, 1, 2, 3, 5, 10], tickFormat: (delta) => words.amount(delta), tickSize: 4 }),
      Plot.ruleX([1], { stroke: SOFT_INK, strokeDasharray: '3 3' }),
      Plot.areaY(points, { x: 'delta', y1: 'lower', y2: 'upper', z: 'line', fill: ({ line }) => seriesStyle(line).stroke, fillOpacity: 0.12 }),
      lines.map((_, line) => Plot.lineY(points.filter((point) => point.line === line), {
        x: 'delta', y: 'value', stroke: seriesStyle(line).stroke, strokeDasharray: seriesStyle(line).dash, strokeWidth: 2,
      })),
      named ? spreadLabels(ends, inner).map(({ label, y }) => Plot.text([label], {
        frameAnchor: 'top-right', textAnchor: 'start', dx: 8, dy: y - TEXT_SIZE / 2, fill: INK,
      })) : [],
      Plot.ruleY([0], { stroke: INK }),
      Plot.text([words.say('axis-delta')], { frameAnchor: 'bottom', dy: 38, fill: SOFT_INK }),
    ],
  });
}

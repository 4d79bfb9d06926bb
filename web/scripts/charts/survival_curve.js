/** Product-limit curves with bands and censoring marks, the numbers at risk in line beneath. */
import * as Plot from '@observablehq/plot';
import { FAINT_RULE, INK, SOFT_INK, TEXT_SIZE, plateStyle, seriesStyle } from './series.js';

const LINE = TEXT_SIZE + 3;
const GROUP_GAP = 6;
const MOST_WITH_ALL_ROWS = 4;
const MARGIN_LEFT = 84;
const MARGIN_RIGHT = 22;

/** A short upright stroke: someone's observation ended there. */
const STROKE = {
  draw(context) {
    context.moveTo(0, -5);
    context.lineTo(0, 0);
  },
};

/**
 * @typedef {object} Curve
 * @property {string} label
 * @property {number[]} years times in years, beginning at 0
 * @property {number[]} survival
 * @property {Array<number|null>} lower
 * @property {Array<number|null>} upper
 * @property {number[]} censorYears
 * @property {number[]} censorSurvival
 * @property {number|null} stop years after which too few remain for the curve to be drawn
 * @property {{atRisk: number[], events: number[], censored: number[]}} counts at `ticks`
 */

/**
 * @param {{ curves: Curve[], ticks: number[] }} data `ticks` in whole years
 * @param {{ width: number, words: ReturnType<typeof import('../words.js').wordsIn> }} options
 */
export function survivalCurve({ curves, ticks }, { width, words }) {
  const shown = readableTicks(ticks, width);
  const rows = countRows(curves, ticks, shown, words);
  const height = Math.min(420, Math.max(260, width * 0.55));
  const below = 58 + rows.length * LINE + curves.length * GROUP_GAP;
  return Plot.plot({
    ...plateStyle(width),
    height: height + below,
    marginLeft: MARGIN_LEFT,
    marginRight: MARGIN_RIGHT,
    marginTop: 18,
    marginBottom: below,
    x: { domain: [0, Math.max(ticks.at(-1), ...curves.map((curve) => points(curve).at(-1).years))], label: null },
    y: { domain: [0, 1], label: null },
    marks: [
      Plot.gridY({ ticks: [0, 0.25, 0.5, 0.75, 1], stroke: FAINT_RULE, strokeOpacity: 1 }),
      Plot.axisY({ ticks: [0, 0.25, 0.5, 0.75, 1], tickFormat: (share) => words.percent(share, 0), tickSize: 0 }),
      Plot.axisX({ ticks: shown, tickFormat: (years) => words.count(years), tickSize: 4 }),
      Plot.text([words.say('axis-years-since-start')], { frameAnchor: 'bottom', dy: 36, fill: SOFT_INK }),
      Plot.ruleY([0], { stroke: INK }),
      curves.flatMap((curve, position) => curveMarks(curve, position)),
      endLabels(curves),
      rows.flatMap((row, position) => rowMarks(row, 58 + position * LINE + row.position * GROUP_GAP)),
    ],
  });
}

/** Every tick where there is room for a number of four figures, else every second, or third… */
function readableTicks(ticks, width) {
  const room = (width - MARGIN_LEFT - MARGIN_RIGHT) / Math.max(1, ticks.length - 1);
  const every = Math.max(1, Math.ceil(36 / room));
  return ticks.filter((_, position) => position % every === 0);
}

/** The curve as points, cut where too few remain. */
function points(curve) {
  const all = curve.years.map((years, i) => ({
    years, survival: curve.survival[i], lower: curve.lower[i], upper: curve.upper[i],
  }));
  if (curve.stop === null) return all;
  const kept = all.filter((point) => point.years <= curve.stop);
  return kept.length ? [...kept, { ...kept.at(-1), years: Math.max(curve.stop, kept.at(-1).years) }] : all;
}

function curveMarks(curve, position) {
  const { stroke, dash } = seriesStyle(position);
  const line = points(curve);
  const last = line.at(-1).years;
  const censored = curve.censorYears
    .map((years, i) => ({ years, survival: curve.censorSurvival[i] }))
    .filter((mark) => mark.years <= last);
  return [
    Plot.areaY(line.filter((point) => point.lower !== null && point.upper !== null), {
      x: 'years', y1: 'lower', y2: 'upper', curve: 'step-after', fill: stroke, fillOpacity: 0.13,
    }),
    Plot.lineY(line, {
      x: 'years', y: 'survival', curve: 'step-after', stroke, strokeWidth: 1.8, strokeDasharray: dash ?? 'none',
    }),
    Plot.dot(censored, { x: 'years', y: 'survival', symbol: STROKE, stroke, strokeOpacity: 0.5, strokeWidth: 0.8 }),
  ];
}

/** Names beside the ends of the lines; one curve alone needs none. */
function endLabels(curves) {
  if (curves.length < 2) return [];
  return curves.map((curve, position) => {
    const end = points(curve).at(-1);
    return Plot.text([end], {
      x: 'years', y: 'survival', text: () => curve.label, textAnchor: 'end', dx: -2,
      dy: position % 2 ? TEXT_SIZE : -TEXT_SIZE * 0.8,
      fill: seriesStyle(position).stroke, stroke: 'white', strokeWidth: 4, fontWeight: 600,
    });
  });
}

/** The lines of numbers under the axis: a group's name, then its counts. */
function countRows(curves, ticks, shown, words) {
  const kinds = curves.length <= MOST_WITH_ALL_ROWS ? ['atRisk', 'events', 'censored'] : ['atRisk'];
  const at = shown.map((years) => ({ years, index: ticks.indexOf(years) }));
  return curves.flatMap((curve, position) => [
    { name: curve.label, heading: true, position, cells: [] },
    ...kinds.map((kind) => ({
      name: words.say(`row-${kind}`), heading: false, position,
      cells: at.map(({ years, index }) => ({ years, text: words.count(curve.counts[kind][index]) })),
    })),
  ]);
}

function rowMarks({ name, heading, position, cells }, dy) {
  const colour = heading ? seriesStyle(position).stroke : SOFT_INK;
  return [
    Plot.text([name], {
      frameAnchor: 'bottom-left', dx: -MARGIN_LEFT, dy, textAnchor: 'start', lineAnchor: 'middle',
      fill: colour, fontWeight: heading ? 600 : 400,
    }),
    Plot.text(cells, { x: 'years', frameAnchor: 'bottom', text: 'text', dy, lineAnchor: 'middle', fill: INK }),
  ];
}

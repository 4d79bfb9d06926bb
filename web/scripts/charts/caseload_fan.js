/** Patients under care year by year: bands for the first course, and a dashed line for each other. */
import * as Plot from '@observablehq/plot';
import { FAINT_RULE, INK, SOFT_INK, TEXT_SIZE, plateStyle, seriesStyle, spreadLabels } from './series.js';

const LABEL_ROOM = 96;
const MARGIN_LEFT = 52;
/** Longer labels take two lines beside the drawing. */
const ONE_LINE = 13;
/** More bands than this hide each other: then only the first course has its own. */
const MOST_BANDS = 1;

/** @typedef {{ value: number, p50: [number, number], p80: [number, number], p95: [number, number] }} Band */

/**
 * @param {{ courses: Array<{label: string, bands: Band[]}>, held?: number[] }} data each course from today on, a year apart;
 *   `held` are those of the first course who have been here longer than was ever seen
 * @param {{ width: number, words: ReturnType<typeof import('../words.js').wordsIn> }} options
 */
export function caseloadFan({ courses, held = [] }, { width, words }) {
  const height = Math.min(400, Math.max(260, width * 0.52));
  const points = courses.map(({ bands }) => bands.map((band, year) => ({
    year, value: band.value, l80: band.p80[0], u80: band.p80[1], l95: band.p95[0], u95: band.p95[1], l50: band.p50[0], u50: band.p50[1],
  })));
  const highest = Math.max(...points.flat().map(({ u95 }) => u95)) * 1.06;
  const years = points[0].length - 1;
  const plotHeight = height - 16 - 44;
  const ends = spreadLabels(points.map((line, position) => ({
    label: courses[position].label, position, y: 16 + (1 - line.at(-1).value / highest) * plotHeight,
  })), height - 44, courses.some(({ label }) => label.length > ONE_LINE) ? 2 * TEXT_SIZE + 3 : undefined);
  return Plot.plot({
    ...plateStyle(width),
    height,
    marginLeft: MARGIN_LEFT,
    marginRight: courses.length > 1 ? LABEL_ROOM : 20,
    marginTop: 16,
    marginBottom: 44,
    x: { domain: [0, years], label: null },
    y: { domain: [0, highest], label: null },
    marks: [
      Plot.gridY({ ticks: 6, stroke: FAINT_RULE, strokeOpacity: 1 }),
      Plot.axisY({ tickSize: 0, ticks: 6, tickFormat: (n) => words.count(n) }),
      Plot.axisX({ ticks: points[0].map(({ year }) => year).filter((year) => year % Math.ceil(years / 10) === 0), tickFormat: (year) => words.count(year), tickSize: 4 }),
      Plot.text([words.say('axis-years-from-closing')], { frameAnchor: 'bottom', dy: 36, fill: SOFT_INK }),
      Plot.areaY(held.map((count, year) => ({ count, year })), { x: 'year', y: 'count', fill: SOFT_INK, fillOpacity: 0.28 }),
      held.length ? Plot.text([{ year: years, count: held.at(-1) }], {
        x: 'year', y: 'count', text: () => words.say('beyond-seen'), textAnchor: 'end', dx: -4, dy: -8, fill: SOFT_INK, stroke: 'white', strokeWidth: 5,
      }) : null,
      points.flatMap((line, position) => courseMarks(line, position, position < MOST_BANDS)),
      courses.length > 1 ? ends.map((end) => Plot.text([end.label], {
        frameAnchor: 'top-right', dx: 8, dy: end.y - 16, textAnchor: 'start', lineAnchor: 'middle', lineWidth: (LABEL_ROOM - 10) / TEXT_SIZE,
        fill: seriesStyle(end.position).stroke, fontWeight: 600,
      })) : [],
      Plot.ruleY([0], { stroke: INK }),
    ],
  });
}

function courseMarks(line, position, banded) {
  const { stroke, dash } = seriesStyle(position);
  return [
    banded ? Plot.areaY(line, { x: 'year', y1: 'l95', y2: 'u95', fill: stroke, fillOpacity: 0.1 }) : null,
    banded ? Plot.areaY(line, { x: 'year', y1: 'l80', y2: 'u80', fill: stroke, fillOpacity: 0.14 }) : null,
    banded ? Plot.areaY(line, { x: 'year', y1: 'l50', y2: 'u50', fill: stroke, fillOpacity: 0.2 }) : null,
    Plot.lineY(line, { x: 'year', y: 'value', stroke, strokeWidth: 2, strokeDasharray: dash ?? 'none' }),
    Plot.dot(line, { x: 'year', y: 'value', r: 2.6, fill: stroke }),
  ];
}

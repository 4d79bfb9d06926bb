/** Where everybody is: still under care, and each way of having left, stacked to the whole. */
import * as Plot from '@observablehq/plot';
import { INK, SOFT_INK, TEXT_SIZE, plateStyle, seriesFill, spreadLabels } from './series.js';

const LABEL_ROOM = 224;
const NARROW = 520;

/**
 * @param {{ layers: Array<{label: string, years: number[], share: number[]}>, lastYear: number }} data
 *   layers from the bottom up; all on the same times
 * @param {{ width: number, words: ReturnType<typeof import('../words.js').wordsIn> }} options
 */
export function leavingStack({ layers, lastYear }, { width, words }) {
  const beside = width >= NARROW;
  const marginRight = beside ? LABEL_ROOM : 16;
  const plotHeight = Math.min(380, Math.max(240, width * 0.5));
  const marginTop = 14;
  const legendRows = beside ? 0 : layers.length;
  const marginBottom = 44 + legendRows * (TEXT_SIZE + 6);
  const bands = stacked(layers);
  const last = bands.map((band) => ({ label: band.label, middle: (band.lower.at(-1) + band.upper.at(-1)) / 2 }));
  const ends = spreadLabels(last.map(({ label, middle }) => ({ label, y: (1 - middle) * plotHeight })), plotHeight);
  return Plot.plot({
    ...plateStyle(width),
    height: plotHeight + marginTop + marginBottom,
    marginLeft: 48,
    marginRight,
    marginTop,
    marginBottom,
    x: { domain: [0, lastYear], label: null },
    y: { domain: [0, 1], label: null },
    marks: [
      bands.map((band, position) =>
        Plot.areaY(band.years.map((years, i) => ({ years, lower: band.lower[i], upper: band.upper[i] })), {
          x: 'years', y1: 'lower', y2: 'upper', curve: 'step-after',
          fill: seriesFill(position), stroke: 'white', strokeWidth: 0.7,
        })),
      Plot.axisY({ ticks: [0, 0.25, 0.5, 0.75, 1], tickFormat: (share) => words.percent(share, 0), tickSize: 0 }),
      Plot.axisX({ interval: 1, tickFormat: (years) => words.count(years), tickSize: 4 }),
      Plot.text([words.say('axis-years-since-start')], { frameAnchor: 'bottom', dy: 36, fill: SOFT_INK }),
      beside
        ? ends.map((end) => Plot.text([end.label], {
            frameAnchor: 'top-right', dx: 8, dy: end.y, textAnchor: 'start', lineAnchor: 'middle', fill: INK,
          }))
        : [],
      beside ? [] : legend(layers),
    ],
  });
}

/** Running sums of the layers. */
function stacked(layers) {
  const below = layers[0].years.map(() => 0);
  return layers.map(({ label, years, share }) => {
    const lower = [...below];
    share.forEach((part, i) => {
      below[i] += part;
    });
    return { label, years, lower, upper: [...below] };
  });
}

function legend(layers) {
  return layers.map(({ label }, position) => [
    Plot.text(['■'], {
      frameAnchor: 'bottom-left', dy: 54 + position * (TEXT_SIZE + 6), textAnchor: 'start', fill: seriesFill(position),
      stroke: INK, strokeWidth: 0.4, fontSize: 16,
    }),
    Plot.text([label], { frameAnchor: 'bottom-left', dx: 18, dy: 54 + position * (TEXT_SIZE + 6), textAnchor: 'start', fill: INK }),
  ]);
}

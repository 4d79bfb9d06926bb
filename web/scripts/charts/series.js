/** How series are told apart: by dash and darkness first, so that a black-and-white print keeps them apart. */

const STYLES = [
  { stroke: '#0b5563', dash: null },
  { stroke: '#1c1b19', dash: '7 3' },
  { stroke: '#8c5a00', dash: '2 3' },
  { stroke: '#5d5a8a', dash: '9 3 2 3' },
  { stroke: '#6b665d', dash: '4 2 1 2 1 2' },
  { stroke: '#9b3d5a', dash: '12 4' },
];

/** @param {number} position */
export function seriesStyle(position) {
  return STYLES[position % STYLES.length];
}

/** Fills for stacked areas, from dark to light, with the accent first. */
const FILLS = ['#0b5563', '#4b8792', '#a3c4ca', '#57534c', '#9a948a', '#cfc9be', '#e7e2d8'];

/** @param {number} position */
export function seriesFill(position) {
  return FILLS[position % FILLS.length];
}

export const INK = '#1c1b19';
export const SOFT_INK = '#57534c';
export const FAINT_RULE = '#e2ddd3';
export const TEXT_SIZE = 12;

/** What every drawing shares. @param {number} width */
export function plateStyle(width) {
  return { width, style: { fontSize: `${TEXT_SIZE}px`, background: 'none', color: INK, overflow: 'visible' } };
}

/**
 * Labels at the right end of lines, moved apart so that none covers another.
 * @template {{label: string, y: number}} End
 * @param {End[]} ends y in pixels from the top
 * @param {number} height of the plot in pixels; labels stay within it where there is room
 * @param {number} gap least distance in pixels
 */
export function spreadLabels(ends, height, gap = TEXT_SIZE + 3) {
  const placed = ends.map((end) => ({ ...end })).sort((a, b) => a.y - b.y);
  for (let i = 1; i < placed.length; i += 1) {
    placed[i].y = Math.max(placed[i].y, placed[i - 1].y + gap);
  }
  for (let i = placed.length - 1; i >= 0; i -= 1) {
    const below = i === placed.length - 1 ? height : placed[i + 1].y - gap;
    placed[i].y = Math.min(placed[i].y, below);
  }
  return placed;
}

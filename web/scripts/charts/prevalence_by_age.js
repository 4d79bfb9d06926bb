/** Shares by age group as steps, one line for each moment. */
import * as Plot from '@observablehq/plot';
import { FAINT_RULE, INK, SOFT_INK, TEXT_SIZE, plateStyle, seriesStyle, spreadLabels } from './series.js';

const MARGINS = { left: 52, top: 16, bottom: 44 };
const LABEL_ROOM = 104;

/**
 * @param {Array<Record<string, number>>} groups with from_age and to_age
 * @param {Array<{label: string, name: string}>} lines which number of the groups each line shows
 * @param {{ width: number, words: ReturnType<typeof import('../words.js').wordsIn> }} options
 */
export function prevalenceByAge(groups, lines, { width, words }) {
  const highest = Math.max(...groups.flatMap((group) => lines.map(({ name }) => group[name] ?? 0)), 1e-6) * 1.08;
  const height = Math.min(360, Math.max(240, width * 0.46));
  const ends = spreadLabels(lines.map(({ label, name }, position) => ({
    label, position, y: MARGINS.top + (1 - (groups.at(-1)[name] ?? 0) / highest) * (height - MARGINS.top - MARGINS.bottom),
  })), height - MARGINS.bottom, 2 * TEXT_SIZE + 4);
  const digits = highest < 0.05 ? 1 : 0;
  return Plot.plot({
    ...plateStyle(width),
    height,
    marginLeft: MARGINS.left, marginRight: LABEL_ROOM, marginTop: MARGINS.top, marginBottom: MARGINS.bottom,
    x: { domain: [groups[0].from_age, groups.at(-1).to_age], label: null },
    y: { domain: [0, highest], label: null },
    marks: [
      Plot.gridY({ ticks: 5, stroke: FAINT_RULE, strokeOpacity: 1 }),
      Plot.axisY({ ticks: 5, tickSize: 0, tickFormat: (share) => words.percent(share, digits) }),
      Plot.axisX({ ticks: [...groups.map((group) => group.from_age), groups.at(-1).to_age], tickFormat: (age) => words.count(age), tickSize: 4 }),
      Plot.text([words.say('axis-age')], { frameAnchor: 'bottom', dy: 36, fill: SOFT_INK }),
      lines.map(({ name }, position) => Plot.line(
        groups.flatMap((group) => [{ age: group.from_age, share: group[name] }, { age: group.to_age, share: group[name] }]),
        { x: 'age', y: 'share', strokeWidth: 2, stroke: seriesStyle(position).stroke, strokeDasharray: seriesStyle(position).dash ?? 'none' },
      )),
      ends.map((end) => Plot.text([end.label], {
        frameAnchor: 'top-right', dx: 8, dy: end.y - MARGINS.top, textAnchor: 'start', lineAnchor: 'middle', lineWidth: (LABEL_ROOM - 10) / (TEXT_SIZE * 1.2),
        fill: seriesStyle(end.position).stroke, fontWeight: 600,
      })),
      Plot.ruleY([0], { stroke: INK }),
    ],
  });
}

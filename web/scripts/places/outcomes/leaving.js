/** What became of those who left: each way of leaving beside the others. */
import { leavingStack } from '../../charts/leaving_stack.js';
import { answerBlock } from '../../parts/answer.js';
import { h } from '../../parts/element.js';
import { figure } from '../../parts/figure.js';
import { cautionList, levelName } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { DAYS_PER_YEAR } from '../../units.js';

const YEARS = [1, 3, 5];

/** @param {import('../../app.js').App} app */
export function leavingBlock(app) {
  return answerBlock(app, {
    id: 'leaving',
    title: 'leaving-title',
    ask: ({ cohort, question }) => cohort && { task: 'outcomes.leaving', request: { group: question.group, years: YEARS } },
    draw: (answer, { question }) => [
      ...answer.groups.flatMap((group) => drawGroup(app, group, levelName(app, question.group, group.level))),
      cautionList(app, answer.cautions),
      h('p', { class: 'method' }, app.words.say('leaving-method')),
    ],
  });
}

function drawGroup(app, group, name) {
  const { say } = app.words;
  const years = group.time.map((days) => days / DAYS_PER_YEAR);
  const ways = group.ways.filter((way) => way.events > 0);
  const layers = [
    { label: say('meaning-under_care'), years, share: group.under_care },
    ...ways.map((way) => ({ label: say(`meaning-${way.meaning}`), years, share: way.incidence })),
  ];
  const inGroup = group.level === null ? '' : say('sentence-group', { group: name });
  return [
    group.level === null ? null : h('h3', {}, name),
    h('p', { class: 'sentence' }, leavingSentence(app, group, ways, inGroup)),
    figure(app, {
      name: `leaving${group.level === null ? '' : `-${group.level}`}`,
      title: say('leaving-figure', { group: name }),
      described: say('leaving-figure-described', { ways: ways.length }),
      draw: (width) => leavingStack({ layers, lastYear: Math.max(1, years.at(-1)) }, { width, words: app.words }),
    }),
    incidenceTable(app, ways, name),
  ];
}

/** The largest way of leaving, at the last year that all can be read. */
function leavingSentence(app, group, ways, inGroup) {
  const { say, percent } = app.words;
  const position = YEARS.findLastIndex((_, i) => ways.some((way) => way.at_years[i]?.value !== null));
  if (position < 0 || !ways.length) return say('leaving-sentence-nobody', { group: inGroup });
  const at = (way) => way.at_years[position]?.value ?? 0;
  const most = ways.reduce((a, b) => (at(b) > at(a) ? b : a));
  const gone = ways.reduce((sum, way) => sum + at(way), 0);
  return say('leaving-sentence', {
    group: inGroup, years: YEARS[position], stayed: percent(1 - gone), way: say(`meaning-${most.meaning}`), share: percent(at(most)),
  });
}

/** One line for each way, one column for each year; the wrong figure stands beside the last year. */
function incidenceTable(app, ways, name) {
  const { say, count, percent, estimate } = app.words;
  const last = YEARS.length - 1;
  return table(app, {
    name: 'ways-of-leaving', caption: say('leaving-caption', { group: name }), rows: ways, note: say('leaving-note'),
    columns: [
      { heading: say('way-of-leaving'), show: (way) => say(`meaning-${way.meaning}`), text: true },
      { heading: say('events-in-all'), show: (way) => count(way.events), full: (way) => way.events },
      ...YEARS.map((years, i) => ({
        heading: say('by-years', { years }),
        show: (way) => estimate(way.at_years[i], (share) => percent(share)),
        full: (way) => way.at_years[i].value,
      })),
      {
        heading: say('one-minus-survival', { years: YEARS[last] }),
        show: (way) => percent(way.one_minus_survival_at_years[last]),
        full: (way) => way.one_minus_survival_at_years[last],
      },
    ],
  });
}

/** How far to trust the projection: against what happened, and where its bands come from. */
import { backTestFan } from '../../charts/back_test.js';
import { partsBars } from '../../charts/parts_bars.js';
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, numberField } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { figure } from '../../parts/figure.js';
import { live } from '../../parts/live.js';
import { cautionList } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { bandColumns } from './bands.js';
import { setting, settingFaults } from './request.js';

const FARTHEST_BACK = 10;
const LEVELS = ['p50', 'p80', 'p95'];
const PARTS = ['inflow', 'leaving', 'chance'];

/** @param {import('../../app.js').App} app */
export function backTestBlock(app) {
  return answerBlock(app, {
    id: 'back-test',
    title: 'back-test-title',
    choices: live(app, ({ caseload }) => caseload.backYears, ({ caseload }) => {
      const { say } = app.words;
      return [choiceRow(numberField({
        id: 'back-years', label: say('back-years'), value: caseload.backYears, least: 1, greatest: FARTHEST_BACK, step: 1,
        fault: backYearsAreFine(caseload.backYears) ? null : say('fault-whole-between', { least: 1, greatest: FARTHEST_BACK }),
        onchange: (backYears) => app.store.amend('caseload', { backYears }),
      }))];
    }),
    ask: ({ cohort, caseload }) => (cohort && backYearsAreFine(caseload.backYears)
      ? { task: 'caseload.back_test', request: { back_years: caseload.backYears, damping: caseload.basis === 'trend' ? dampingOf(caseload) : null } } : null),
    draw: (answer) => drawBackTest(app, answer),
  });
}

/** The back-test follows the basis chosen above where that is the trend. */
function dampingOf(caseload) {
  return settingFaults(caseload).damping ? null : caseload.damping;
}

function backYearsAreFine(years) {
  return Number.isInteger(years) && years >= 1 && years <= FARTHEST_BACK;
}

function drawBackTest(app, answer) {
  const { say, count, day, percent } = app.words;
  const { band, seen } = answer.path.at(-1);
  const inside = seen >= band.p95[0] && seen <= band.p95[1];
  const yes = (held) => say(held ? 'yes' : 'no');
  const monthly = answer.path.filter(({ month }) => month % 3 === 0);
  return [
    h('p', { class: 'sentence' }, say(inside ? 'back-test-held' : 'back-test-missed', {
      origin: day(answer.origin), ends: day(answer.closing_date), value: count(band.value), lower: count(band.p95[0]), upper: count(band.p95[1]), seen: count(seen),
    })),
    h('p', {}, say('back-test-flows', {
      newcomers: count(answer.newcomers.band.value), seen_newcomers: count(answer.newcomers.seen), leaving: count(answer.leaving.band.value), seen_leaving: count(answer.leaving.seen),
    })),
    figure(app, {
      name: 'back-test', title: say('back-test-figure', { origin: day(answer.origin) }), described: say('back-test-described'),
      draw: (width) => backTestFan(answer.path, { width, words: app.words }),
      data: table(app, {
        name: 'back-test', caption: say('back-test-path-caption'), rows: monthly,
        columns: [
          { heading: say('on-day'), show: (row) => day(row.ends), text: true },
          ...bandColumns(app, say('projected'), (row) => row.band),
          { heading: say('seen'), show: (row) => count(row.seen), full: (row) => row.seen },
        ],
      }),
    }),
    h('p', { class: 'sentence' }, say('back-tests-sentence', { count: answer.tests.length, held: answer.tests_held.p95, held80: answer.tests_held.p80 })),
    table(app, {
      name: 'back-tests', caption: say('back-tests-caption', { ends: day(answer.closing_date) }), rows: answer.tests,
      note: say('back-tests-note', { p50: percent(answer.months_held.p50, 0), p80: percent(answer.months_held.p80, 0), p95: percent(answer.months_held.p95, 0) }),
      columns: [
        { heading: say('projected-on'), show: (row) => day(row.origin), text: true },
        ...bandColumns(app, say('projected'), (row) => row.band),
        { heading: say('seen'), show: (row) => count(row.seen), full: (row) => row.seen },
        ...LEVELS.map((level) => ({ heading: say(`held-${level}`), show: (row) => yes(row.held[level]), text: true })),
      ],
    }),
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, say(answer.trend ? 'back-test-method-trend' : 'back-test-method')),
  ];
}

/** @param {import('../../app.js').App} app */
export function partsBlock(app) {
  return answerBlock(app, {
    id: 'parts',
    title: 'parts-title',
    ask: (state) => {
      const request = setting(state);
      return request && { task: 'caseload.parts', request };
    },
    draw: (answer) => drawParts(app, answer),
  });
}

function drawParts(app, { years }) {
  const { say, percent, day } = app.words;
  const last = years.at(-1);
  const most = PARTS.reduce((a, b) => (last[b] > last[a] ? b : a));
  const parts = PARTS.map((part) => ({ part, label: say(`part-${part}`) }));
  return [
    h('p', { class: 'sentence' }, say('parts-sentence', { ends: day(last.ends), part: say(`part-${most}`), share: percent(last[most], 0) })),
    figure(app, {
      name: 'parts', title: say('parts-figure'), described: say('parts-described'),
      draw: (width) => partsBars(years, parts, { width, words: app.words }),
    }),
    table(app, {
      name: 'parts', caption: say('parts-caption'), rows: years,
      columns: [
        { heading: say('year-to'), show: (row) => day(row.ends), text: true },
        ...PARTS.map((part) => ({ heading: say(`part-${part}`), show: (row) => percent(row[part], 0), full: (row) => row[part] })),
      ],
    }),
    h('p', { class: 'method' }, say('parts-method')),
  ];
}

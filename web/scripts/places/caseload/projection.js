/** The projection: a fan from today's patients into the coming years. */
import { caseloadFan } from '../../charts/caseload_fan.js';
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, numberField, selectOne } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { figure } from '../../parts/figure.js';
import { live } from '../../parts/live.js';
import { cautionList } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { bandColumns } from './bands.js';
import { BASES, FARTHEST, TAILS, projectionRequest, settingFaults } from './request.js';

/** @param {import('../../app.js').App} app */
export function projectionBlock(app) {
  return answerBlock(app, {
    id: 'projection',
    title: 'projection-title',
    choices: choices(app),
    empty: 'projection-needs-newcomers',
    ask: projectionRequest,
    draw: (answer) => drawProjection(app, answer),
  });
}

function choices(app) {
  const chosen = ({ caseload }) => ['years', 'basis', 'perYear', 'incidence', 'population', 'growth', 'damping', 'completeness', 'tail'].map((name) => caseload[name]);
  return live(app, chosen, ({ caseload }) => {
    const { say } = app.words;
    const faults = settingFaults(caseload);
    const put = (patch) => app.store.amend('caseload', patch);
    const field = (name, id, options = {}) => numberField({
      id: `caseload-${id}`, label: say(`caseload-${id}`), value: caseload[name], least: 0,
      fault: faults[name] ? say(faults[name][0], faults[name][1]) : null, onchange: (value) => put({ [name]: value }), ...options,
    });
    const choose = (name, options) => selectOne({
      id: `caseload-${name}`, label: say(`caseload-${name}`), value: caseload[name],
      options: options.map((value) => ({ value, label: say(`caseload-${name}-${value}`) })), onchange: (value) => put({ [name]: value }),
    });
    const growth = field('growth', 'growth', { least: -50, unit: say('percent-sign') });
    /** @type {Record<string, Array<HTMLElement>>} */
    const more = {
      history: [],
      trend: [field('damping', 'damping', { greatest: 1, hint: say('caseload-damping-hint') })],
      typed: [field('perYear', 'per-year'), growth],
      incidence: [field('incidence', 'incidence'), field('population', 'population'), growth],
    };
    return [
      choiceRow(field('years', 'years', { least: 1, greatest: FARTHEST, step: 1 }), choose('basis', BASES), ...more[caseload.basis]),
      choiceRow(
        field('completeness', 'completeness', { least: 1, greatest: 100, unit: say('percent-sign'), hint: say('caseload-completeness-hint') }),
        choose('tail', TAILS)),
    ];
  });
}

function drawProjection(app, answer) {
  const { words } = app;
  const { say, count, day } = words;
  const last = answer.baseline.under_care.at(-1);
  const courses = [{ label: say('baseline'), bands: answer.baseline.under_care }];
  const held = answer.tail.held_share.map((share, year) => share * answer.baseline.under_care[year].value);
  const rows = answer.baseline.under_care.map((band, year) => ({
    ends: year === 0 ? answer.closing_date : answer.years[year - 1].ends, band,
    newcomers: year === 0 ? null : answer.baseline.newcomers[year - 1],
    held: held[year],
    gone: year === 0 ? null : leftInYear(answer.baseline, year - 1),
  }));
  return [
    h('p', { class: 'sentence' }, say('projection-sentence', {
      today: count(answer.baseline.under_care[0].value), years: answer.years.length, ends: day(answer.years.at(-1).ends),
      value: count(last.value), lower: count(last.p95[0]), upper: count(last.p95[1]),
    })),
    figure(app, {
      name: 'caseload', title: say('projection-figure'), described: say('projection-figure-described', { years: answer.years.length }),
      draw: (width) => caseloadFan({ courses, held }, { width, words }),
    }),
    table(app, {
      name: 'caseload', caption: say('projection-caption'), rows, note: say('projection-note', { draws: answer.draws, seed: answer.seed }),
      columns: [
        { heading: say('on-day'), show: (row) => day(row.ends), text: true },
        ...bandColumns(app, say('under-care'), (row) => row.band),
        { heading: say('beyond-seen'), show: (row) => count(row.held), full: (row) => row.held },
        { heading: say('newcomers'), show: (row) => count(row.newcomers?.value), full: (row) => row.newcomers?.value },
        { heading: say('left-in-all'), show: (row) => count(row.gone), full: (row) => row.gone },
      ],
    }),
    cautionList(app, answer.cautions),
    h('p', {}, say(`tail-${answer.tail.rule}`, { years: answer.tail.from_years })),
    h('p', { class: 'method' }, say('projection-method')),
  ];
}

/** Everybody who leaves in a year, in any way. */
function leftInYear(course, year) {
  return course.leaving.reduce((sum, way) => sum + way.values[year].value, 0);
}

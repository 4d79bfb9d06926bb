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
import { FARTHEST, projectionRequest, yearsAreFine } from './request.js';

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
  return live(app, (state) => [state.caseload.years, state.caseload.basis, state.caseload.perYear], ({ caseload }) => {
    const { say } = app.words;
    return [choiceRow(
      numberField({
        id: 'caseload-years', label: say('years-ahead'), value: caseload.years, least: 1, greatest: FARTHEST, step: 1,
        fault: yearsAreFine(caseload.years) ? null : say('fault-whole-between', { least: 1, greatest: FARTHEST }),
        onchange: (years) => app.store.amend('caseload', { years }),
      }),
      selectOne({
        id: 'caseload-basis', label: say('newcomers-basis'), value: caseload.basis,
        options: ['history', 'typed'].map((basis) => ({ value: basis, label: say(`newcomers-basis-${basis}`) })),
        onchange: (basis) => app.store.amend('caseload', { basis }),
      }),
      caseload.basis === 'typed' ? numberField({
        id: 'caseload-per-year', label: say('newcomers-per-year'), value: caseload.perYear, least: 0,
        fault: caseload.perYear < 0 ? say('fault-negative') : null,
        onchange: (perYear) => app.store.amend('caseload', { perYear }),
      }) : null)];
  });
}

function drawProjection(app, answer) {
  const { words } = app;
  const { say, count, day } = words;
  const last = answer.baseline.under_care.at(-1);
  const courses = [{ label: say('baseline'), bands: answer.baseline.under_care }];
  const rows = answer.baseline.under_care.map((band, year) => ({
    ends: year === 0 ? answer.closing_date : answer.years[year - 1].ends, band,
    newcomers: year === 0 ? null : answer.baseline.newcomers[year - 1],
    gone: year === 0 ? null : leftInYear(answer.baseline, year - 1),
  }));
  return [
    h('p', { class: 'sentence' }, say('projection-sentence', {
      today: count(answer.baseline.under_care[0].value), years: answer.years.length, ends: day(answer.years.at(-1).ends),
      value: count(last.value), lower: count(last.p95[0]), upper: count(last.p95[1]),
    })),
    figure(app, {
      name: 'caseload', title: say('projection-figure'), described: say('projection-figure-described', { years: answer.years.length }),
      draw: (width) => caseloadFan({ courses }, { width, words }),
    }),
    table(app, {
      name: 'caseload', caption: say('projection-caption'), rows, note: say('projection-note', { draws: answer.draws, seed: answer.seed }),
      columns: [
        { heading: say('on-day'), show: (row) => day(row.ends), text: true },
        ...bandColumns(app, say('under-care'), (row) => row.band),
        { heading: say('newcomers'), show: (row) => count(row.newcomers?.value), full: (row) => row.newcomers?.value },
        { heading: say('left-in-all'), show: (row) => count(row.gone), full: (row) => row.gone },
      ],
    }),
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, say('projection-method', { years: answer.tail.from_years })),
  ];
}

/** Everybody who leaves in a year, in any way. */
function leftInYear(course, year) {
  return course.leaving.reduce((sum, way) => sum + way.values[year].value, 0);
}

/** Scenarios beside the baseline: what each changes, what it costs, which buys most for the same money. */
import { caseloadFan } from '../../charts/caseload_fan.js';
import { swings } from '../../charts/swings.js';
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, selectOne } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { figure } from '../../parts/figure.js';
import { live } from '../../parts/live.js';
import { cautionList } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { bandColumns } from './bands.js';
import { itemsAsked, typedFaultless } from './items.js';
import { leversFaultless, leversForm, scenariosAsked } from './levers_form.js';
import { setting } from './request.js';

const CHANGES = ['under_care', 'patient_years', 'newcomers', 'deaths', 'lost', 'programme', 'care', 'cost'];
/** More lines than this cannot be told apart. */
const MOST_DRAWN = 4;

/** @param {import('../../app.js').App} app */
export function leversBlock(app) {
  return answerBlock(app, {
    id: 'levers',
    title: 'levers-title',
    choices: h('div', {}, leversForm(app), sensitivityChoice(app)),
    empty: 'levers-type',
    ask: leversRequest,
    draw: (answer) => drawLevers(app, answer),
  });
}

function leversRequest(state) {
  const request = setting(state);
  const { caseload } = state;
  const scenarios = scenariosAsked(caseload);
  if (!request || !scenarios.length || !leversFaultless(caseload) || !typedFaultless(caseload)) return null;
  return {
    task: 'caseload.levers',
    request: {
      ...request, scenarios, items: itemsAsked(caseload), discount: caseload.discount, budget: caseload.budget,
      sensitivity_of: Math.min(caseload.sensitivityOf, scenarios.length - 1),
    },
  };
}

function sensitivityChoice(app) {
  return live(app, ({ caseload }) => [scenariosAsked(caseload).map(({ name }) => name), caseload.sensitivityOf], ({ caseload }) => {
    const scenarios = scenariosAsked(caseload);
    if (scenarios.length < 2) return [];
    return [choiceRow(selectOne({
      id: 'sensitivity-of', label: app.words.say('sensitivity-of'), value: String(Math.min(caseload.sensitivityOf, scenarios.length - 1)),
      options: scenarios.map(({ name }, i) => ({ value: String(i), label: name })),
      onchange: (position) => app.store.amend('caseload', { sensitivityOf: Number(position) }),
    }))];
  });
}

/** A change with its sign; money and numbers of patients whole. @param {import('../../app.js').App} app */
export function signedCount(app) {
  return (number) => (number === null || number === undefined ? '–' : `${number > 0.5 ? '+' : ''}${app.words.count(Math.abs(number) < 0.5 ? 0 : number)}`);
}

function drawLevers(app, answer) {
  const { say, count, percent } = app.words;
  const best = answer.scenarios.reduce((a, b) => (b.best_for_patient_years > a.best_for_patient_years ? b : a));
  const drawn = answer.scenarios.slice(0, MOST_DRAWN);
  return [
    ...answer.scenarios.map((scenario) => h('p', { class: 'sentence' }, scenarioSentence(app, answer, scenario))),
    answer.scenarios.length > 1 ? h('p', { class: 'sentence' }, say('levers-best-sentence', {
      name: best.name, share: percent(best.best_for_patient_years, 0), budget: count(answer.budget),
    })) : null,
    figure(app, {
      name: 'scenarios', title: say('levers-figure'), described: say('levers-figure-described', { years: answer.years.length }),
      draw: (width) => caseloadFan({
        courses: [{ label: say('baseline'), bands: answer.baseline.under_care }, ...drawn.map(({ name, under_care: bands }) => ({ label: name, bands }))],
      }, { width, words: app.words }),
      data: pathTable(app, answer),
    }),
    ...answer.scenarios.map((scenario, position) => changeTable(app, answer, scenario, position)),
    priceTable(app, answer),
    ...sensitivityPart(app, answer),
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, say('levers-method', { draws: answer.draws, seed: answer.seed })),
  ];
}

function scenarioSentence(app, answer, { name, difference }) {
  const { say } = app.words;
  const write = signedCount(app);
  return say('levers-sentence', {
    name, years: answer.years.length, more: write(difference.under_care.value), lower: write(difference.under_care.p95[0]), upper: write(difference.under_care.p95[1]),
    patient_years: write(difference.patient_years.value), lost: write(difference.lost.value), deaths: write(difference.deaths.value), cost: write(difference.cost.value),
  });
}

function pathTable(app, answer) {
  const { say, count } = app.words;
  return table(app, {
    name: 'scenarios', caption: say('levers-path-caption'), rows: answer.baseline.under_care.map((band, year) => ({ band, year })),
    columns: [
      { heading: say('axis-years-from-closing'), show: (row) => count(row.year), full: (row) => row.year },
      { heading: say('baseline'), show: (row) => count(row.band.value), full: (row) => row.band.value },
      ...answer.scenarios.map(({ name, under_care: bands }) => ({ heading: name, show: (row) => count(bands[row.year].value), full: (row) => bands[row.year].value })),
    ],
  });
}

function changeTable(app, answer, scenario, position) {
  const { say, percent } = app.words;
  const fractions = scenario.attributable_fractions.filter((fraction) => fraction !== null);
  return table(app, {
    name: `scenario-${position + 1}`, caption: say('levers-change-caption', { name: scenario.name, years: answer.years.length }),
    note: fractions.length ? say('levers-fraction-note', { fraction: fractions.map((fraction) => percent(fraction, 0)) }) : undefined,
    rows: CHANGES.map((what) => ({ what, band: scenario.difference[what] })),
    columns: [
      { heading: say('measure'), show: (row) => say(`difference-${row.what}`), text: true },
      ...bandColumns(app, say('difference'), (row) => row.band, signedCount(app)),
    ],
  });
}

function priceTable(app, answer) {
  const { say, count, percent } = app.words;
  const price = ({ value, band, gained }) => {
    if (value === null) return say('price-no-gain');
    if (!band) return say('price-unsure', { value: count(value), gained: percent(gained, 0) });
    return say('estimate', { value: count(value), lower: count(band.p95[0]), upper: count(band.p95[1]) });
  };
  const ranked = [...answer.scenarios].sort((a, b) => b.best_for_patient_years - a.best_for_patient_years);
  return table(app, {
    name: 'prices', caption: say('prices-caption', { budget: count(answer.budget) }), note: say('prices-note'), rows: ranked,
    columns: [
      { heading: say('scenario'), show: (row) => row.name, text: true },
      { heading: say('price-per-patient-year'), show: (row) => price(row.per_patient_year), full: (row) => row.per_patient_year.value },
      { heading: say('price-per-death'), show: (row) => price(row.per_death), full: (row) => row.per_death.value },
      { heading: say('best-for-patient-years'), show: (row) => percent(row.best_for_patient_years, 0), full: (row) => row.best_for_patient_years },
      { heading: say('best-for-deaths'), show: (row) => percent(row.best_for_deaths, 0), full: (row) => row.best_for_deaths },
    ],
  });
}

function sensitivityPart(app, answer) {
  const { say, count, decimal } = app.words;
  const { scenario, value } = answer.sensitivity;
  const { name } = answer.scenarios[scenario];
  if (value === null) return [h('p', { class: 'note' }, say('sensitivity-none', { name }))];
  const known = answer.sensitivity.swings.filter((swing) => swing.at_low !== null && swing.at_high !== null);
  const rows = known.map((swing) => ({ ...swing, label: say(`swing-${swing.what}`) }));
  const end = (row, at) => (row.what === 'newcomers' || row.what === 'discount' ? decimal(row[at], 0) : `× ${decimal(row[at], 2)}`);
  return [
    figure(app, {
      name: 'sensitivity', title: say('sensitivity-figure', { name }), described: say('sensitivity-described'),
      draw: (width) => swings({ rows, value }, { width, words: app.words }),
    }),
    table(app, {
      name: 'sensitivity', caption: say('sensitivity-caption', { name, value: count(value) }), note: say('sensitivity-note'), rows,
      columns: [
        { heading: say('swing-what'), show: (row) => row.label, text: true },
        { heading: say('swing-low'), show: (row) => end(row, 'low'), full: (row) => row.low },
        { heading: say('swing-at-low'), show: (row) => count(row.at_low), full: (row) => row.at_low },
        { heading: say('swing-high'), show: (row) => end(row, 'high'), full: (row) => row.high },
        { heading: say('swing-at-high'), show: (row) => count(row.at_high), full: (row) => row.at_high },
      ],
    }),
  ];
}

/** A district without a register: how many are ill by age, from incidence and mortality. */
import { prevalenceByAge } from '../../charts/prevalence_by_age.js';
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, numberField } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { figure } from '../../parts/figure.js';
import { complete, typedGrid } from '../../parts/grid.js';
import { live } from '../../parts/live.js';
import { cautionList } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { exampleButtons } from './example.js';

const FIELDS = ['from_age', 'population', 'prevalence', 'incidence', 'mortality_well', 'mortality_ill'];
/** What a typed share or rate is divided by to be one for a single person. */
const PER = { prevalence: 100, incidence: 1000, mortality_well: 1000, mortality_ill: 1000 };
const OLDEST = 130;
const FARTHEST = 50;
const blank = () => Object.fromEntries(FIELDS.map((name) => [name, null]));
const EMPTY = { rows: [], lastAge: 90, years: 10 };
/** Invented. */
const EXAMPLE = {
  ...EMPTY,
  rows: [
    { from_age: 0, population: 82000, prevalence: 0.1, incidence: 0.2, mortality_well: 4, mortality_ill: 20 },
    { from_age: 15, population: 96000, prevalence: 0.8, incidence: 1.2, mortality_well: 3, mortality_ill: 14 },
    { from_age: 40, population: 54000, prevalence: 4.5, incidence: 6, mortality_well: 8, mortality_ill: 28 },
    { from_age: 60, population: 28000, prevalence: 9, incidence: 11, mortality_well: 32, mortality_ill: 75 },
  ],
};

/** @param {import('../../app.js').App} app */
export function districtPart(app) {
  return answerBlock(app, {
    id: 'counts-district',
    title: 'counts-district-title',
    choices: form(app),
    empty: 'counts-district-empty',
    ask: ({ counts }) => request(counts.district),
    draw: (answer) => draw(app, answer),
  });
}

/** What is wrong with a row, in words. */
function faults(app, row) {
  const { say } = app.words;
  /** @type {Record<string, string>} */
  const found = {};
  for (const name of FIELDS) {
    const value = row[name];
    if (value === null || value === undefined) continue;
    const greatest = PER[name] ?? (name === 'from_age' ? OLDEST : Infinity);
    if (value < 0) found[name] = say('fault-negative');
    else if (value > greatest) found[name] = say('fault-between', { least: 0, greatest });
    else if (name === 'from_age' && !Number.isInteger(value)) found[name] = say('fault-not-whole');
  }
  return found;
}

function numbersAreFine({ lastAge, years }) {
  return Number.isInteger(lastAge) && lastAge >= 1 && lastAge <= OLDEST && Number.isInteger(years) && years >= 1 && years <= FARTHEST;
}

function request(typed) {
  const rows = typed.rows.filter((row) => complete(row, FIELDS));
  const strange = rows.some((row) => Object.entries(PER).some(([name, per]) => row[name] < 0 || row[name] > per) || row.population < 0);
  if (!rows.length || strange || !numbersAreFine(typed)) return null;
  const groups = rows.map((row) => ({ ...row, ...Object.fromEntries(Object.entries(PER).map(([name, per]) => [name, row[name] / per])) }));
  return { task: 'counts.district', request: { groups, last_age: typed.lastAge, years: typed.years } };
}

function form(app) {
  return live(app, (state) => state.counts.district, ({ counts: { district } }) => {
    const { say } = app.words;
    const shown = ({ rows }) => (rows.length ? rows : [blank(), blank()]);
    const change = (patch) => app.store.amend('counts', { district: { ...app.store.state.counts.district, ...patch } });
    const whole = (name, id, greatest) => numberField({
      id: `district-${id}`, label: say(`district-${id}`), value: district[name], least: 1, greatest, step: 1,
      fault: Number.isInteger(district[name]) && district[name] >= 1 && district[name] <= greatest ? null : say('fault-whole-between', { least: 1, greatest }),
      onchange: (value) => change({ [name]: value }),
    });
    return [
      h('p', {}, say('counts-district-lead')),
      typedGrid(app, {
        id: 'district', caption: say('district-caption'), rows: shown(district), current: () => shown(app.store.state.counts.district), blank,
        columns: FIELDS.map((name) => ({ name, heading: say(`district-${name}`), kind: /** @type {const} */ ('number'), least: 0, step: name === 'from_age' ? 1 : 'any' })),
        faults: (row) => faults(app, row),
        onchange: (rows) => change({ rows }),
      }),
      choiceRow(whole('lastAge', 'last-age', OLDEST), whole('years', 'years', FARTHEST)),
      exampleButtons(app, 'district', EXAMPLE, EMPTY),
    ];
  });
}

function draw(app, answer) {
  const { words } = app;
  const { say, count, percent } = words;
  const last = answer.path.at(-1);
  const ages = (row) => say('interval-from-to', { from: row.from_age, to: row.to_age });
  return [
    h('p', { class: 'sentence' }, say('district-sentence', {
      now: count(answer.path[0].ill), years: last.year, then: count(last.ill), share: percent(last.prevalence, 1),
    })),
    h('p', {}, say(answer.years_to_steady === null ? 'district-steady-far' : 'district-steady', {
      steady: count(answer.steady_ill), distance: percent(answer.distance, 0), years: answer.years_to_steady ?? 0,
    })),
    figure(app, {
      name: 'prevalence-by-age', title: say('district-figure', { years: last.year }), described: say('district-figure-described'),
      draw: (width) => prevalenceByAge(answer.groups, [
        { label: say('district-now'), name: 'prevalence_now' },
        { label: say('district-then', { years: last.year }), name: 'prevalence_then' },
        { label: say('district-in-steady-state'), name: 'steady_prevalence' },
      ], { width, words }),
    }),
    table(app, {
      name: 'prevalence-by-age', caption: say('district-groups-caption'), rows: answer.groups,
      columns: [
        { heading: say('district-ages'), show: ages, text: true },
        { heading: say('district-ill-now'), show: (row) => count(row.ill_now), full: (row) => row.ill_now },
        { heading: say('district-share-now'), show: (row) => percent(row.prevalence_now, 1), full: (row) => row.prevalence_now },
        { heading: say('district-ill-then', { years: last.year }), show: (row) => count(row.ill_then), full: (row) => row.ill_then },
        { heading: say('district-share-then', { years: last.year }), show: (row) => percent(row.prevalence_then, 1), full: (row) => row.prevalence_then },
        { heading: say('district-share-steady'), show: (row) => percent(row.steady_prevalence, 1), full: (row) => row.steady_prevalence },
      ],
    }),
    table(app, {
      name: 'district', caption: say('district-path-caption'), rows: answer.path,
      columns: [
        { heading: say('after-years'), show: (row) => count(row.year), full: (row) => row.year },
        { heading: say('district-ill'), show: (row) => count(row.ill), full: (row) => row.ill },
        { heading: say('district-share'), show: (row) => percent(row.prevalence, 2), full: (row) => row.prevalence },
      ],
    }),
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, say('district-method')),
  ];
}

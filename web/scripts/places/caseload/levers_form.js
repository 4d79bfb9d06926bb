/** What the person types about levers: one row each; rows with the same name act together. */
import { button, choiceRow, numberField, selectOne } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { numberFaults, typedGrid } from '../../parts/grid.js';
import { live } from '../../parts/live.js';

export const LEVERS = ['fewer_lost', 'fewer_deaths', 'fewer_stopped', 'more_completed', 'fewer_newcomers', 'risk_factor', 'found_earlier'];
const MONEY = ['cost_at_start', 'cost_per_year'];
const MOST_MORE = 1000;
const MOST_MONTHS = 360;
const LONGEST_LEAD = 60;

export const blankLever = () => ({
  scenario: '', kind: 'fewer_lost', percent: null, from_month: 1, ramp_months: 0, cost_at_start: null, cost_per_year: null,
  prevalence: null, relative_risk: null, among: 'population', months_earlier: 6, fewer_deaths_among: 0,
});

/** Invented. @param {(key: string) => string} say */
function example(say) {
  return [
    { ...blankLever(), scenario: say('levers-example-tracing'), kind: 'fewer_lost', percent: 40, ramp_months: 6, cost_per_year: 12000 },
    { ...blankLever(), scenario: say('levers-example-screening'), kind: 'found_earlier', percent: 30, months_earlier: 6, fewer_deaths_among: 25, ramp_months: 3, cost_at_start: 5000, cost_per_year: 20000 },
    { ...blankLever(), scenario: say('levers-example-both'), kind: 'fewer_lost', percent: 40, ramp_months: 6, cost_per_year: 12000 },
    { ...blankLever(), scenario: say('levers-example-both'), kind: 'found_earlier', percent: 30, months_earlier: 6, fewer_deaths_among: 25, ramp_months: 3, cost_at_start: 5000, cost_per_year: 20000 },
  ];
}

const mostOf = (kind) => (kind === 'more_completed' ? MOST_MORE : 100);
const within = (value, least, greatest) => value !== null && value >= least && value <= greatest;
const wholeWithin = (value, least, greatest) => Number.isInteger(value) && within(value, least, greatest);

/** What is wrong with a row, by field; each is [key of a sentence, its parameters]. */
function faultsOf(row) {
  /** @type {Record<string, [string, object]>} */
  const found = {};
  const check = (name, fine, key, least, greatest) => {
    if (!fine) found[name] = [key, { least, greatest }];
  };
  if (row.percent !== null) check('percent', within(row.percent, 0, mostOf(row.kind)), 'fault-between', 0, mostOf(row.kind));
  check('from_month', wholeWithin(row.from_month, 1, MOST_MONTHS), 'fault-whole-between', 1, MOST_MONTHS);
  check('ramp_months', wholeWithin(row.ramp_months, 0, MOST_MONTHS), 'fault-whole-between', 0, MOST_MONTHS);
  if (row.kind === 'risk_factor') {
    if (row.prevalence !== null) check('prevalence', within(row.prevalence, 0, 100), 'fault-between', 0, 100);
    if (row.relative_risk !== null) check('relative_risk', within(row.relative_risk, 1, 1000), 'fault-between', 1, 1000);
  }
  if (row.kind === 'found_earlier') {
    check('months_earlier', wholeWithin(row.months_earlier, 1, LONGEST_LEAD), 'fault-whole-between', 1, LONGEST_LEAD);
    check('fewer_deaths_among', within(row.fewer_deaths_among, 0, 100), 'fault-between', 0, 100);
  }
  return found;
}

/** Scenarios in the order in which they are first named; rows that are not yet filled are left out. */
export function scenariosAsked({ levers }) {
  const filled = levers.filter((row) => row.percent !== null && (row.kind !== 'risk_factor' || (row.prevalence !== null && row.relative_risk !== null)));
  /** @type {Map<string, any[]>} */
  const named = new Map();
  filled.forEach((row, i) => {
    const name = row.scenario.trim() || String(i + 1);
    named.set(name, [...(named.get(name) ?? []), leverAsked(row)]);
  });
  return [...named].map(([name, levers]) => ({ name, levers }));
}

function leverAsked({ kind, percent, from_month, ramp_months, cost_at_start, cost_per_year, prevalence, relative_risk, among, months_earlier, fewer_deaths_among }) {
  return {
    kind, percent, from_month, ramp_months, cost_at_start: cost_at_start ?? 0, cost_per_year: cost_per_year ?? 0,
    ...(kind === 'risk_factor' ? { prevalence, relative_risk, among_patients: among === 'patients' } : {}),
    ...(kind === 'found_earlier' ? { months_earlier, fewer_deaths_among } : {}),
  };
}

/** Whether everything typed can be asked with. */
export function leversFaultless({ levers, budget }) {
  return budget > 0 && levers.every((row) => !Object.keys(faultsOf(row)).length && MONEY.every((name) => (row[name] ?? 0) >= 0));
}

/** @param {import('../../app.js').App} app */
export function leversForm(app) {
  return live(app, ({ caseload }) => [caseload.levers, caseload.budget], ({ caseload }) => {
    const { say } = app.words;
    const put = (patch) => app.store.amend('caseload', patch);
    const shown = (rows) => (rows.length ? rows : [blankLever()]);
    const current = () => shown(app.store.state.caseload.levers);
    const number = (name) => ({ name, heading: say(`lever-${name}`), kind: /** @type {const} */ ('number'), least: 0 });
    return [
      h('p', {}, say('levers-lead')),
      typedGrid(app, {
        id: 'levers', caption: say('levers-caption'), rows: shown(caseload.levers), current, blank: blankLever,
        columns: [
          { name: 'scenario', heading: say('scenario'), kind: 'text' },
          { name: 'kind', heading: say('lever'), kind: 'choice', options: LEVERS.map((kind) => ({ value: kind, label: say(`lever-${kind}`) })) },
          ...['percent', 'from_month', 'ramp_months', ...MONEY].map(number),
        ],
        faults: (row) => ({
          ...numberFaults(app, row, MONEY, { whole: false }),
          ...Object.fromEntries(Object.entries(faultsOf(row)).map(([name, [key, parameters]]) => [name, say(key, parameters)])),
        }),
        onchange: (levers) => put({ levers }),
      }),
      ...shown(caseload.levers).map((row, position) => extras(app, row, position, (patch) =>
        put({ levers: current().map((each, i) => (i === position ? { ...each, ...patch } : each)) }))),
      choiceRow(numberField({
        id: 'levers-budget', label: say('levers-budget'), hint: say('levers-budget-hint'), value: caseload.budget, least: 0,
        fault: caseload.budget > 0 ? null : say('fault-not-above-zero'), onchange: (budget) => put({ budget }),
      })),
      h('p', { class: 'actions' },
        button(say('counts-example'), () => put({ levers: example(say) }), { class: 'plain', id: 'levers-example' }),
        button(say('counts-clear'), () => put({ levers: [] }), { class: 'plain', id: 'levers-clear' })),
    ];
  });
}

/** Further fields of the levers that need them. */
function extras(app, row, position, change) {
  const { say } = app.words;
  const found = faultsOf(row);
  const field = (name, options = {}) => numberField({
    id: `levers-${position}-${name}`, label: say(`lever-${name}`), value: row[name], least: 0,
    fault: found[name] ? say(found[name][0], found[name][1]) : null, onchange: (value) => change({ [name]: value }), ...options,
  });
  const legend = h('legend', {}, say('lever-more', { row: position + 1, lever: say(`lever-${row.kind}`) }));
  if (row.kind === 'risk_factor') {
    return h('fieldset', { class: 'choice' }, legend, choiceRow(
      field('prevalence', { unit: say('percent-sign') }), field('relative_risk'),
      selectOne({
        id: `levers-${position}-among`, label: say('lever-among'), value: row.among,
        options: ['population', 'patients'].map((among) => ({ value: among, label: say(`lever-among-${among}`) })), onchange: (among) => change({ among }),
      })));
  }
  if (row.kind === 'found_earlier') {
    return h('fieldset', { class: 'choice' }, legend, choiceRow(
      field('months_earlier', { step: 1 }), field('fewer_deaths_among', { unit: say('percent-sign') })));
  }
  return null;
}

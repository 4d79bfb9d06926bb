/** Proportional-hazards regression on chosen covariates. */
import { hazardRatios } from '../../charts/hazard_ratios.js';
import { answerBlock } from '../../parts/answer.js';
import { h } from '../../parts/element.js';
import { figure } from '../../parts/figure.js';
import { cautionList, covariateName, levelName } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { covariateChoices, coxRequest } from './covariates.js';

/** @param {import('../../app.js').App} app */
export function coxBlock(app) {
  return answerBlock(app, {
    id: 'cox',
    title: 'cox-title',
    empty: 'cox-choose-covariates',
    choices: covariateChoices(app),
    ask: coxRequest,
    draw: (answer) => drawCox(app, answer),
  });
}

function drawCox(app, answer) {
  const { words } = app;
  const { say } = words;
  const terms = answer.terms.map((term) => ({ ...term, label: termLabel(app, term) }));
  return [
    ...terms.slice(0, 1).map((term) => mainSentence(app, term, answer)),
    h('p', {}, say('cox-does-not-mean')),
    h('p', {}, hiddenCause(app, answer.e_value)),
    figure(app, {
      name: 'hazard-ratios', title: say('cox-figure'), described: say('cox-figure-described', { terms: terms.length }),
      draw: (width) => hazardRatios(terms, { width, words }),
    }),
    termsTable(app, terms),
    fitTable(app, answer),
    proportionalNote(app, answer),
    answer.left_out.length
      ? h('p', { class: 'note' }, say('cox-left-out', { covariates: answer.left_out.map(({ id }) => covariateName(app, id)) }))
      : null,
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, say(`cox-method-${answer.ties}`)),
  ];
}

/** "Severity: severe against mild" or "Age at start, per 10". */
export function termLabel(app, { id, level, reference, per }) {
  const { say, amount } = app.words;
  const covariate = covariateName(app, id);
  return level === null
    ? say('cox-term-number', { covariate, per: amount(per) })
    : say('cox-term-level', { covariate, level: levelName(app, id, level), reference: levelName(app, id, reference) });
}

function mainSentence(app, term, answer) {
  const { say, ratio, pValue } = app.words;
  const { value, lower, upper } = term.hazard_ratio;
  const direction = lower > 1 ? 'higher' : upper < 1 ? 'lower' : 'unclear';
  return h('p', { class: 'sentence' }, say(`cox-sentence-${direction}`, {
    term: term.label, ratio: ratio(value), interval: say('from-to', { lower: ratio(lower), upper: ratio(upper) }),
    p: pValue(term.p), others: new Set(answer.terms.map(({ id }) => id)).size - 1, n: answer.n, events: answer.events,
  }));
}

/** How strong something unmeasured would have to be to explain the first ratio away. */
function hiddenCause(app, { estimate, limit, common }) {
  const { say, ratio } = app.words;
  const key = limit > 1 ? 'e-value' : 'e-value-of-unclear';
  return say(key, { estimate: ratio(estimate), limit: ratio(limit), scale: common ? 'common' : 'rare' });
}

function termsTable(app, terms) {
  const { say, count, decimal, ratio, pValue, estimate } = app.words;
  return table(app, {
    name: 'cox', caption: say('cox-caption'), rows: terms,
    columns: [
      { heading: say('covariate'), show: (row) => row.label, text: true },
      { heading: say('patients'), show: (row) => count(row.n), full: (row) => row.n },
      { heading: say('coefficient'), show: (row) => decimal(row.coefficient, 3), full: (row) => row.coefficient },
      { heading: say('standard-error'), show: (row) => decimal(row.standard_error, 3), full: (row) => row.standard_error },
      { heading: say('hazard-ratio'), show: (row) => estimate(row.hazard_ratio, ratio), full: (row) => row.hazard_ratio.value },
      { heading: say('p-value'), show: (row) => pValue(row.p), full: (row) => row.p },
    ],
  });
}

/** Tests of the whole model and how well it ranks patients. */
function fitTable(app, answer) {
  const { say, count, decimal, pValue, estimate } = app.words;
  const tests = ['likelihood_ratio', 'wald', 'score'].map((name) => ({ label: say(`test-${name}`), ...answer.tests[name] }));
  return h('div', {},
    h('p', { class: 'note' }, say('cox-fit', {
      n: answer.n, events: answer.events, concordance: estimate(answer.concordance, (c) => decimal(c, 3)),
    })),
    table(app, {
      name: 'cox-tests', caption: say('cox-tests-caption'), rows: tests,
      columns: [
        { heading: say('test'), show: (row) => row.label, text: true },
        { heading: say('chi-squared'), show: (row) => decimal(row.chi_squared, 2), full: (row) => row.chi_squared },
        { heading: say('degrees-of-freedom'), show: (row) => count(row.df), full: (row) => row.df },
        { heading: say('p-value'), show: (row) => pValue(row.p), full: (row) => row.p },
      ],
    }));
}

/** Whether the hazard ratios may be taken as constant over time. */
function proportionalNote(app, answer) {
  const { say, decimal, pValue } = app.words;
  const whole = answer.proportional_global;
  if (!whole || whole.p === null) return null;
  return h('p', {}, say(whole.p < 0.05 ? 'not-proportional' : 'proportional', {
    chi: decimal(whole.chi_squared, 2), df: whole.df, p: pValue(whole.p),
  }));
}

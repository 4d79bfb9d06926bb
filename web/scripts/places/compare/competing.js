/** The chance of the outcome when other endings can come first: subdistribution hazards beside cause-specific ones. */
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, tickSeveral } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { live } from '../../parts/live.js';
import { ENDINGS } from '../../parts/question.js';
import { cautionList } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { coxRequest } from './covariates.js';
import { termLabel } from './cox.js';

/** After these the outcome cannot come any more; after the other endings it can, unseen. */
const RULE_OUT = ['died_of_disease', 'died_of_other_cause', 'died_cause_unknown', 'recovered'];

/** @param {import('../../app.js').App} app */
export function competingBlock(app) {
  return answerBlock(app, {
    id: 'subdistribution',
    title: 'subdistribution-title',
    empty: 'cox-choose-covariates',
    choices: competingChoices(app),
    ask: (state) => {
      const cox = coxRequest(state);
      if (!cox) return null;
      const { covariates, interest, timing } = cox.request;
      return { task: 'compare.subdistribution', request: { covariates, interest, timing, competing: competing(state) } };
    },
    draw: (answer) => draw(app, answer),
  });
}

/** What was ticked, without what has meanwhile become the outcome itself. */
function competing(state) {
  const { interest } = state.question;
  return (state.compare.competing ?? RULE_OUT).filter((meaning) => !interest.includes(meaning));
}

function competingChoices(app) {
  return live(app, (state) => [state.compare.competing, state.question.interest], (state) => {
    const { say } = app.words;
    return [choiceRow(tickSeveral({
      id: 'competing', legend: say('subdistribution-competing'), hint: say('subdistribution-competing-hint'),
      options: ENDINGS.filter((meaning) => !state.question.interest.includes(meaning))
        .map((meaning) => ({ value: meaning, label: say(`meaning-${meaning}`) })),
      values: competing(state),
      onchange: (chosen) => app.store.amend('compare', { competing: chosen }),
    }))];
  });
}

function draw(app, { fit, of_interest: ofInterest, of_competing: ofCompeting, cautions }) {
  const { say, ratio } = app.words;
  const [first] = fit.terms;
  const { value, lower, upper } = first.hazard_ratio;
  const direction = lower > 1 ? 'higher' : upper < 1 ? 'lower' : 'unclear';
  const rows = fit.terms.map((term, i) => ({ label: termLabel(app, term), term, cause: ofInterest[i], other: ofCompeting[i] }));
  return [
    h('p', { class: 'sentence' }, say(`subdistribution-sentence-${direction}`, {
      term: rows[0].label, ratio: ratio(value), interval: say('from-to', { lower: ratio(lower), upper: ratio(upper) }),
      events: fit.events, competing: fit.competing, n: fit.n,
    })),
    h('p', {}, say('subdistribution-does-not-mean')),
    ratiosTable(app, rows),
    ofCompeting.length ? null : h('p', { class: 'note' }, say('subdistribution-too-few-competing')),
    cautionList(app, cautions),
    h('p', { class: 'method' }, say('subdistribution-method')),
  ];
}

function ratiosTable(app, rows) {
  const { say, ratio, pValue, estimate } = app.words;
  const hazard = (key, pick) => ({
    heading: say(key), show: (row) => (pick(row) ? estimate(pick(row).hazard_ratio, ratio) : '–'),
    full: (row) => pick(row)?.hazard_ratio.value ?? null,
  });
  return table(app, {
    name: 'subdistribution', caption: say('subdistribution-caption'), rows,
    columns: [
      { heading: say('covariate'), show: (row) => row.label, text: true },
      hazard('subdistribution-ratio', (row) => row.term),
      { heading: say('p-value'), show: (row) => pValue(row.term.p), full: (row) => row.term.p },
      hazard('subdistribution-of-interest', (row) => row.cause),
      hazard('subdistribution-of-competing', (row) => row.other),
    ],
  });
}

/** One what-if beside the baseline: what it would change. */
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, numberField } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { live } from '../../parts/live.js';
import { table } from '../../parts/table.js';
import { bandColumns } from './bands.js';
import { projectionRequest } from './request.js';

const LEVERS = ['fewer_newcomers', 'fewer_lost', 'fewer_deaths'];

/** @param {import('../../app.js').App} app */
export function whatIfBlock(app) {
  return answerBlock(app, {
    id: 'what-if',
    title: 'what-if-title',
    choices: choices(app),
    empty: 'what-if-off',
    ask: (state) => (state.caseload.whatIf.on ? projectionRequest(state) : null),
    draw: (answer) => drawWhatIf(app, answer),
  });
}

function choices(app) {
  return live(app, (state) => [state.caseload.whatIf, state.caseload.years], ({ caseload }) => {
    const { say } = app.words;
    const { whatIf } = caseload;
    const change = (patch) => app.store.amend('caseload', { whatIf: { ...app.store.state.caseload.whatIf, ...patch } });
    const lever = (name) => numberField({
      id: `what-if-${name}`, label: say(`lever-${name}`), value: whatIf[name], least: 0, greatest: 100, unit: say('percent-sign'),
      fault: whatIf[name] < 0 || whatIf[name] > 100 ? say('lever-fault') : null,
      onchange: (percentage) => change({ [name]: percentage ?? 0 }),
    });
    return [
      h('label', { class: 'tick choice' },
        h('input', { type: 'checkbox', id: 'what-if-on', checked: whatIf.on, onchange: (event) => change({ on: event.target.checked }) }),
        ' ', say('what-if-use')),
      whatIf.on ? choiceRow(...LEVERS.map(lever), numberField({
        id: 'what-if-from', label: say('lever-from-year'), hint: say('lever-from-year-hint'), value: whatIf.from_year,
        least: 1, greatest: caseload.years, step: 1, onchange: (year) => change({ from_year: Math.max(1, Math.round(year ?? 1)) }),
      })) : null,
    ];
  });
}

function drawWhatIf(app, answer) {
  const { say, count } = app.words;
  const { difference } = answer;
  const last = difference.under_care.at(-1);
  const totals = ['newcomers', 'deaths', 'lost', 'patient_years', 'visits', 'medicine_units', 'cost']
    .map((name) => ({ name, band: difference.total[name] }))
    .filter(({ band }) => band.value !== 0 || band.p95.some((limit) => limit !== 0));
  const signed = (number) => (number > 0 ? `+${count(number)}` : count(number));
  return [
    h('p', { class: 'sentence' }, say('what-if-sentence', {
      years: answer.years.length, more: signed(last.value), lower: signed(last.p95[0]), upper: signed(last.p95[1]),
      deaths: signed(difference.total.deaths.value), lost: signed(difference.total.lost.value),
    })),
    table(app, {
      name: 'what-if', caption: say('what-if-caption', { years: answer.years.length }), note: say('what-if-note'),
      rows: [{ name: 'under_care', band: last }, ...totals],
      columns: [
        { heading: say('measure'), show: (row) => say(`difference-${row.name}`), text: true },
        ...bandColumns(app, say('difference'), (row) => row.band, signed),
      ],
    }),
    h('p', { class: 'method' }, say('what-if-method')),
  ];
}

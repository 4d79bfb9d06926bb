/** How many the next audit needs, for four kinds of question. */
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, numberField, selectOne } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { live } from '../../parts/live.js';
import { cautionList } from '../../parts/said.js';
import { table } from '../../parts/table.js';

/** A share is typed in percent; `open` shares lie between 0 and 100 and are neither. */
const share = (name, open = true) => ({ name, percent: true, least: 0, greatest: 100, open });
const optional = (name) => ({ name, optional: true, least: 1, step: 1 });
const POWER = { name: 'power', percent: true, least: 50, greatest: 99.9 };
const SIGNIFICANCE = { name: 'significance', percent: true, least: 0.01, greatest: 50 };
const CONFIDENCE = { name: 'confidence', percent: true, least: 50, greatest: 99.99 };

/** The fields of each question, in the words of the engine's request. */
const QUESTIONS = {
  survival_size: [
    { name: 'hazard_ratio', least: 0.01, greatest: 100 }, share('survival'), { name: 'at_years', least: 0.01, greatest: 50 },
    { name: 'accrual_years', least: 0, greatest: 50 }, { name: 'follow_up_years', least: 0, greatest: 50 },
    share('share_exposed'), { name: 'lost', percent: true, least: 0, greatest: 95 }, POWER, SIGNIFICANCE, optional('available'),
  ],
  proportions_size: [
    share('exposed'), share('reference'), { name: 'reference_for_each', least: 0.01, greatest: 100 }, POWER, SIGNIFICANCE, optional('available'),
  ],
  survey_size: [
    share('proportion'), share('margin'), { name: 'design_effect', least: 1, greatest: 100 },
    { name: 'response', percent: true, least: 1, greatest: 100 }, CONFIDENCE, optional('population'),
  ],
  accuracy_size: [share('sensitivity'), share('specificity'), share('margin'), share('prevalence'), CONFIDENCE],
};

/** What may stand there before anybody has thought about it. */
const USUAL = {
  share_exposed: 50, lost: 10, power: 80, significance: 5, confidence: 95, reference_for_each: 1, design_effect: 1, response: 90,
};

/** @param {import('../../app.js').App} app */
export function planningPart(app) {
  return answerBlock(app, {
    id: 'counts-planning',
    title: 'planning-title',
    choices: form(app),
    empty: 'planning-empty',
    ask: ({ counts }) => request(counts.planning),
    draw: (answer, { counts: { planning } }) => DRAWINGS[planning.question](app, answer, planning),
  });
}

function value(planning, { name }) {
  return planning.typed[name] ?? USUAL[name] ?? null;
}

function request(planning) {
  const fields = QUESTIONS[planning.question];
  const complete = fields.every((field) => {
    const number = value(planning, field);
    return number === null ? field.optional : !outside(field, number);
  });
  if (!complete) return null;
  return {
    task: `counts.${planning.question}`,
    request: Object.fromEntries(fields.map((field) => {
      const number = value(planning, field);
      return [field.name, field.percent && number !== null ? number / 100 : number];
    })),
  };
}

function outside({ least, greatest = Infinity, open, step }, number) {
  if (open && (number <= least || number >= greatest)) return true;
  return number < least || number > greatest || (step === 1 && !Number.isInteger(number));
}

function form(app) {
  return live(app, (state) => state.counts.planning, ({ counts: { planning } }) => {
    const { say } = app.words;
    const change = (patch) => app.store.amend('counts', { planning: { ...app.store.state.counts.planning, ...patch } });
    const fields = QUESTIONS[planning.question].map((field) => {
      const number = value(planning, field);
      return numberField({
        id: `planning-${field.name}`, label: say(`planning-${field.name}`), value: number, unit: field.percent ? '%' : null,
        least: field.least, greatest: field.greatest, step: field.step,
        fault: number !== null && outside(field, number) ? fault(say, field) : null,
        onchange: (typed) => change({ typed: { ...app.store.state.counts.planning.typed, [field.name]: typed } }),
      });
    });
    return [
      h('p', {}, say('planning-lead')),
      choiceRow(selectOne({
        id: 'planning-question', label: say('planning-question'), value: planning.question,
        options: Object.keys(QUESTIONS).map((question) => ({ value: question, label: say(`planning-${question}`) })),
        onchange: (question) => change({ question }),
      })),
      choiceRow(...fields),
    ];
  });
}

function fault(say, { least, greatest, open, step }) {
  if (greatest === undefined) return say(step === 1 ? 'fault-not-whole' : 'fault-not-positive');
  return say(open ? 'fault-not-between' : 'fault-not-from-to', { least, greatest });
}

const DRAWINGS = {
  survival_size(app, answer, planning) {
    const { say, count, percent, amount } = app.words;
    return [
      h('p', { class: 'sentence' }, say('planning-survival-sentence', {
        events: count(answer.events), patients: count(answer.patients), ratio: amount(value(planning, { name: 'hazard_ratio' })),
        power: percent(value(planning, { name: 'power' }) / 100, 0), share: percent(answer.share_with_event, 0),
      })),
      powerSentence(app, answer, planning),
      table(app, {
        name: 'planning-survival', caption: say('planning-survival-caption'), rows: answer.others,
        columns: [
          { heading: say('hazard-ratio'), show: (row) => amount(Number(row.hazard_ratio.toPrecision(3))), full: (row) => row.hazard_ratio },
          { heading: say('planning-power'), show: (row) => percent(row.power, 0), full: (row) => row.power },
          { heading: say('planning-events'), show: (row) => count(row.events), full: (row) => row.events },
          { heading: say('patients'), show: (row) => count(row.patients), full: (row) => row.patients },
        ],
      }),
      ...ending(app, answer.cautions, 'planning-survival-method'),
    ];
  },
  proportions_size(app, answer, planning) {
    const { say, count, percent } = app.words;
    return [
      h('p', { class: 'sentence' }, say('planning-proportions-sentence', {
        exposed: count(answer.exposed), reference: count(answer.reference), power: percent(value(planning, { name: 'power' }) / 100, 0),
      })),
      powerSentence(app, answer, planning),
      table(app, {
        name: 'planning-proportions', caption: say('planning-proportions-caption'), rows: answer.others,
        columns: [
          { heading: say('planning-power'), show: (row) => percent(row.power, 0), full: (row) => row.power },
          { heading: say('typed-exposed'), show: (row) => count(row.exposed), full: (row) => row.exposed },
          { heading: say('typed-unexposed'), show: (row) => count(row.reference), full: (row) => row.reference },
        ],
      }),
      ...ending(app, answer.cautions, 'planning-proportions-method'),
    ];
  },
  survey_size(app, answer) {
    const { say, count } = app.words;
    return [
      h('p', { class: 'sentence' }, say('planning-survey-sentence', { people: count(answer.people), answers: count(answer.infinite) })),
      ...ending(app, answer.cautions, 'planning-survey-method'),
    ];
  },
  accuracy_size(app, answer) {
    const { say, count } = app.words;
    return [
      h('p', { class: 'sentence' }, say('planning-accuracy-sentence', {
        people: count(answer.people), diseased: count(answer.with_disease), others: count(answer.without_disease),
        sensitivity: count(answer.for_sensitivity), specificity: count(answer.for_specificity),
      })),
      ...ending(app, [], 'planning-accuracy-method'),
    ];
  },
};

function powerSentence(app, answer, planning) {
  if (answer.power_of_available === null) return null;
  const { say, count, percent } = app.words;
  return h('p', {}, say('planning-power-sentence', {
    available: count(value(planning, { name: 'available' })), power: percent(answer.power_of_available, 0),
  }));
}

function ending(app, cautions, method) {
  const { say } = app.words;
  return [h('p', {}, say('planning-guess')), cautionList(app, cautions), h('p', { class: 'method' }, say(method))];
}

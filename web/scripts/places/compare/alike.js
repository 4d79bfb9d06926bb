/** Whether the two groups are alike: who is in them, when they came and how they were followed. */
import { answerBlock } from '../../parts/answer.js';
import { h } from '../../parts/element.js';
import { cautionList, covariateName, levelName } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { pairRequest } from './pair.js';

/** @param {import('../../app.js').App} app */
export function alikeBlock(app) {
  return answerBlock(app, {
    id: 'alike',
    title: 'alike-title',
    empty: 'compare-choose-group',
    ask: (state) => {
      const request = pairRequest(state);
      return request && { task: 'compare.alike', request };
    },
    draw: (answer, state) => draw(app, answer, state.question.group),
  });
}

function draw(app, answer, group) {
  const { say, count } = app.words;
  const { exposed, reference } = answer;
  const names = { exposed: levelName(app, group, exposed.level), reference: levelName(app, group, reference.level) };
  const unlike = answer.characteristics.filter((line) => Math.abs(line.standardised) > UNLIKE).length;
  return [
    h('p', { class: 'sentence' }, say('alike-sentence', {
      ...names, exposedPatients: count(exposed.n), referencePatients: count(reference.n), unlike, of: answer.characteristics.length,
    })),
    sidesTable(app, answer, names),
    answer.characteristics.length ? characteristicsTable(app, answer, names) : null,
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, say('alike-method')),
  ];
}

/** Beyond this a standardised difference is marked; the engine's cautions use the same. */
const UNLIKE = 0.1;

/** A calendar year is a name, not an amount: no mark between its thousands. */
const YEAR = 'start_year';

function sidesTable(app, { exposed, reference }, names) {
  const { say, count, day, decimal, percent } = app.words;
  const rows = [
    { name: 'patients', write: (side) => count(side.n), raw: (side) => side.n },
    { name: 'alike-start', write: (side) => day(side.median_start), raw: (side) => side.median_start },
    { name: 'alike-follow-up', write: (side) => decimal(side.median_follow_up, 1), raw: (side) => side.median_follow_up },
    { name: 'alike-lost', write: (side) => percent(side.lost), raw: (side) => side.lost },
  ];
  const column = (heading, side) => ({ heading, show: (row) => row.write(side), full: (row) => row.raw(side) });
  return table(app, {
    name: 'alike-sides', caption: say('alike-sides-caption'), rows,
    columns: [{ heading: say('characteristic'), show: (row) => say(row.name), text: true }, column(names.exposed, exposed), column(names.reference, reference)],
  });
}

function characteristicsTable(app, { characteristics }, names) {
  const { say, count, decimal, percent } = app.words;
  const cell = (side, position) => ({
    heading: names[side],
    show: (line) => (line.level === null
      ? say('mean-and-spread', { mean: line.id === YEAR ? String(Math.round(line[side])) : decimal(line[side], 1), spread: decimal(line.spread[position], 1) })
      : say('count-and-share', { n: count(line.n[position]), percent: percent(line[side]) })),
    full: (line) => line[side],
  });
  return table(app, {
    name: 'alike', caption: say('alike-caption'), rows: characteristics,
    columns: [
      { heading: say('characteristic'), show: (line) => characteristic(app, line), text: true },
      cell('exposed', 0),
      cell('reference', 1),
      { heading: say('standardised-difference'), show: (line) => decimal(line.standardised, 2), full: (line) => line.standardised },
    ],
  });
}

function characteristic(app, { id, level }) {
  const name = covariateName(app, id);
  return level === null ? app.words.say('mean-of', { covariate: name }) : app.words.say('level-of', { covariate: name, level: levelName(app, id, level) });
}

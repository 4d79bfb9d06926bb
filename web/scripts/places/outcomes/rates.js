/** How often: outcomes for the time observed, by calendar year, time since the start or age, and standardised. */
import { markOf, ratesByBand } from '../../charts/rates_by_band.js';
import { answerBlock } from '../../parts/answer.js';
import { choiceRow, selectOne } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { figure } from '../../parts/figure.js';
import { live } from '../../parts/live.js';
import { cautionList, levelName } from '../../parts/said.js';
import { table } from '../../parts/table.js';

/** Rates are written for so many person-years. */
const PER = 100;
const SCALES = ['year', 'since_start', 'age'];
const STANDARDS = ['who_world', 'segi'];

/** @param {import('../../app.js').App} app */
export function ratesBlock(app) {
  return answerBlock(app, {
    id: 'rates',
    title: 'rates-title',
    choices: scaleChoice(app),
    ask: ({ cohort, question, outcomes }) => cohort && {
      task: 'outcomes.rates', request: { interest: question.interest, group: question.group, by: outcomes.ratesBy },
    },
    draw: (answer, state) => draw(app, answer, state),
  });
}

function scaleChoice(app) {
  return live(app, (state) => state.outcomes.ratesBy, (state) => [choiceRow(selectOne({
    id: 'rates-by', label: app.words.say('rates-by'), value: state.outcomes.ratesBy,
    options: SCALES.map((scale) => ({ value: scale, label: app.words.say(`rates-by-${scale}`) })),
    onchange: (ratesBy) => app.store.amend('outcomes', { ratesBy }),
  }))]);
}

function draw(app, answer, { question, outcomes }) {
  const { say, count } = app.words;
  const groups = answer.groups.map((group, position) => ({
    ...group, position, name: group.level === null ? say('everyone') : levelName(app, question.group, group.level),
  }));
  const bands = answer.bands.map((band) => bandName(app, band, outcomes.ratesBy));
  return [
    ...groups.map((group) => sentence(app, group, groups[0].name)),
    h('p', {}, say('rates-do-not-mean')),
    figure(app, {
      name: `rates-${outcomes.ratesBy}`, title: say('rates-figure', { per: PER }), described: say('rates-figure-described', { bands: bands.length, groups: groups.length }),
      draw: (width) => ratesByBand({
        bands,
        groups: groups.map(({ name }) => name),
        points: groups.flatMap((group) => group.bands.flatMap(({ rate, person_years: years }, band) =>
          (years > 0 ? [{ band, group: group.position, value: rate.value * PER, lower: rate.lower * PER, upper: rate.upper * PER }] : []))),
      }, { width, words: app.words, label: say(`rates-by-${outcomes.ratesBy}`) }),
      below: groups.length > 1 ? h('p', { class: 'hint' }, groups.map(({ name, position }) => `${markOf(position)} ${name}`).join('   ')) : null,
      data: bandTable(app, groups, bands),
    }),
    standardTable(app, groups),
    answer.unknown_age > 0 ? h('p', { class: 'note' }, say('rates-unknown-age', { n: answer.unknown_age, patients: count(answer.unknown_age) })) : null,
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, say('rates-method')),
  ];
}

function bandName(app, { from, to }, scale) {
  if (scale === 'year') return String(from);
  return to === null ? app.words.say('band-from', { from }) : app.words.say('from-to', { lower: from, upper: to });
}

function perHundred(app, { value, lower, upper }) {
  const { estimate, decimal } = app.words;
  const scaled = (number) => (number === null ? null : number * PER);
  return estimate({ value: scaled(value), lower: scaled(lower), upper: scaled(upper) }, (number) => decimal(number, 2));
}

function sentence(app, { name, all, ratio }, first) {
  const { say, count, decimal } = app.words;
  const numbers = {
    group: name, events: count(all.events), years: count(Math.round(all.person_years)), per: PER,
    rate: decimal(all.rate.value * PER, 2), interval: say('from-to', { lower: decimal(all.rate.lower * PER, 2), upper: decimal(all.rate.upper * PER, 2) }),
  };
  if (!ratio || ratio.value === null) return h('p', { class: 'sentence' }, say('rates-sentence', numbers));
  const written = app.words.ratio;
  return h('p', { class: 'sentence' }, say('rates-sentence-compared', {
    ...numbers, first, ratio: written(ratio.value), ratioInterval: say('from-to', { lower: written(ratio.lower), upper: written(ratio.upper) }),
  }));
}

function bandTable(app, groups, bands) {
  const { say, count, decimal } = app.words;
  const rows = groups.flatMap((group) => group.bands.map((band, i) => ({ group: group.name, band: bands[i], ...band }))).filter((row) => row.person_years > 0);
  const grouped = groups.length > 1 ? [{ heading: say('group'), show: (row) => row.group, text: true }] : [];
  return table(app, {
    name: 'rates', caption: say('rates-caption', { per: PER }), rows,
    columns: [
      ...grouped,
      { heading: say('rates-band'), show: (row) => row.band, text: true },
      { heading: say('events'), show: (row) => count(row.events), full: (row) => row.events },
      { heading: say('person-years'), show: (row) => decimal(row.person_years, 0), full: (row) => row.person_years },
      { heading: say('rate-per', { per: PER }), show: (row) => perHundred(app, row.rate), full: (row) => row.rate.value * PER },
    ],
  });
}

function standardTable(app, groups) {
  const { say } = app.words;
  const rows = groups.filter(({ standards }) => standards?.who_world);
  if (!rows.length) return null;
  return table(app, {
    name: 'standardised-rates', caption: say('rates-standardised-caption', { per: PER }), rows,
    columns: [
      { heading: say('group'), show: (row) => row.name, text: true },
      { heading: say('rates-crude'), show: (row) => perHundred(app, row.standards.who_world.crude), full: (row) => row.standards.who_world.crude.value * PER },
      ...STANDARDS.map((name) => ({
        heading: say(`standard-${name}`), show: (row) => perHundred(app, row.standards[name].standardised),
        full: (row) => row.standards[name].standardised.value * PER,
      })),
    ],
  });
}

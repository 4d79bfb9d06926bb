/** What the register's own history says: who came, who left when, who is here today. */
import { newcomersBars } from '../../charts/newcomers_bars.js';
import { answerBlock } from '../../parts/answer.js';
import { h } from '../../parts/element.js';
import { figure } from '../../parts/figure.js';
import { cautionList } from '../../parts/said.js';
import { table } from '../../parts/table.js';

/** @param {import('../../app.js').App} app */
export function historyBlock(app) {
  return answerBlock(app, {
    id: 'history',
    title: 'history-title',
    ask: ({ cohort }) => cohort && { task: 'caseload.history', request: {} },
    draw: (answer) => drawHistory(app, answer),
  });
}

function drawHistory(app, answer) {
  const { words } = app;
  const { say, decimal } = words;
  const { mean, lower, upper, whole_years: whole } = answer.newcomers_per_year;
  return [
    h('p', { class: 'sentence' }, mean === null
      ? say('newcomers-sentence-unknown')
      : say('newcomers-sentence', { mean: decimal(mean, 0), lower: decimal(lower, 0), upper: decimal(upper, 0), years: whole })),
    figure(app, {
      name: 'newcomers', title: say('newcomers-figure'), described: say('newcomers-figure-described'),
      draw: (width) => newcomersBars({ years: answer.newcomers, mean }, { width, words }),
      data: newcomersTable(app, answer.newcomers),
    }),
    ...retentionPart(app, answer),
    todayTable(app, answer.today),
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, say('history-method')),
  ];
}

function newcomersTable(app, years) {
  const { say, count } = app.words;
  return table(app, {
    name: 'newcomers', caption: say('newcomers-figure'), rows: years,
    columns: [
      { heading: say('calendar-year'), show: (row) => String(row.year) },
      { heading: say('newcomers'), show: (row) => count(row.count), full: (row) => row.count },
      { heading: say('whole-year'), show: (row) => say(row.whole ? 'yes' : 'no'), text: true },
    ],
  });
}

function retentionPart(app, { retention, supported_years: supported }) {
  const { say, percent } = app.words;
  const first = retention[0];
  if (!first) return [];
  const most = first.ways.reduce((a, b) => (b.events > a.events ? b : a));
  return [
    h('p', { class: 'sentence' }, first.exits
      ? say('retention-sentence', { staying: percent(first.staying, 0), years: first.to_years, way: say(`meaning-${most.meaning}`), share: percent(most.share, 0) })
      : say('retention-sentence-nobody', { years: first.to_years })),
    retentionTable(app, retention),
    h('p', { class: 'note' }, say('retention-note', { years: supported })),
  ];
}

/** Leaving per 100 patient-years, by how long since start. */
function retentionTable(app, retention) {
  const { say, count, decimal, percent } = app.words;
  const ways = retention[0].ways.map(({ meaning }) => meaning).filter((_, k) => retention.some((row) => row.ways[k].events > 0));
  const way = (row, meaning) => row.ways.find((each) => each.meaning === meaning);
  return table(app, {
    name: 'leaving-rates', caption: say('retention-caption'), rows: retention,
    columns: [
      { heading: say('interval-years'), show: (row) => say('interval-from-to', { from: row.from_years, to: row.to_years }), text: true },
      { heading: say('person-years'), show: (row) => decimal(row.person_years, 0), full: (row) => row.person_years },
      ...ways.map((meaning) => ({
        heading: say(`meaning-${meaning}`),
        show: (row) => decimal(100 * way(row, meaning).hazard, 1),
        full: (row) => 100 * way(row, meaning).hazard,
      })),
      { heading: say('left-in-all'), show: (row) => count(row.exits), full: (row) => row.exits },
      { heading: say('staying'), show: (row) => percent(row.staying, 0), full: (row) => row.staying },
    ],
  });
}

function todayTable(app, today) {
  const { say, count, percent } = app.words;
  return table(app, {
    name: 'today', caption: say('today-caption', { total: today.total }), rows: today.by_duration,
    columns: [
      { heading: say('years-since-start'), show: (row) => say('interval-from-to', { from: row.from_years, to: row.to_years }), text: true },
      { heading: say('patients'), show: (row) => count(row.count), full: (row) => row.count },
      { heading: say('share'), show: (row) => percent(today.total ? row.count / today.total : null, 0), full: (row) => row.count / today.total },
    ],
  });
}

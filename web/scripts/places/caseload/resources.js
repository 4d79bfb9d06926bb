/** What the caseload takes: amounts and money by year, and the month in which there is not enough. */
import { chanceByMonth } from '../../charts/chance_by_month.js';
import { yearRanges } from '../../charts/year_ranges.js';
import { answerBlock } from '../../parts/answer.js';
import { h } from '../../parts/element.js';
import { figure } from '../../parts/figure.js';
import { cautionList } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { bandColumns } from './bands.js';
import { itemsAsked, itemsForm, linesAsked, typedFaultless } from './items.js';
import { setting } from './request.js';

/** @param {import('../../app.js').App} app */
export function resourcesBlock(app) {
  return answerBlock(app, {
    id: 'resources',
    title: 'resources-title',
    choices: itemsForm(app),
    empty: 'resources-type',
    ask: (state) => resourcesRequest(state),
    draw: (answer) => drawResources(app, answer),
  });
}

function resourcesRequest(state) {
  const request = setting(state);
  const { caseload } = state;
  const items = itemsAsked(caseload);
  const lines = linesAsked(caseload);
  if (!request || !(items.length || lines.length) || !typedFaultless(caseload)) return null;
  return { task: 'caseload.resources', request: { ...request, items, lines, discount: caseload.discount } };
}

function drawResources(app, answer) {
  return [
    ...answer.lines.map((line) => h('p', { class: 'sentence' }, lineSentence(app, line))),
    ...capacityPart(app, answer),
    ...costPart(app, answer),
    ...answer.items.filter(({ amount }) => amount.some(({ value }) => value > 0)).map((item, position) => itemTable(app, answer, item, position)),
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, app.words.say('resources-method', { draws: answer.draws, seed: answer.seed })),
  ];
}

function lineName(app, answer, line) {
  if (line.name) return line.name;
  return line.item === null ? app.words.say('line-patients') : answer.items[line.item].name;
}

function lineSentence(app, line) {
  const { say, day, percent } = app.words;
  const name = line.name || say('line-unnamed');
  const chance = percent(line.passed_by.at(-1), 0);
  const when = line.likely_month;
  if (when) return say('line-sentence-likely', { name, month: when.month, ends: day(when.ends), chance });
  if (line.unlikely_month) return say('line-sentence-unlikely', { name, month: line.unlikely_month.month, ends: day(line.unlikely_month.ends), chance });
  return say('line-sentence-never', { name, chance });
}

function capacityPart(app, answer) {
  const { say, count, decimal, percent, day } = app.words;
  if (!answer.lines.length) return [];
  const month = (when) => (when ? say('month-on', { month: when.month, ends: day(when.ends) }) : '–');
  const plain = (when) => when?.month ?? null;
  const beds = answer.lines.filter((line) => line.beds);
  return [
    figure(app, {
      name: 'capacity', title: say('capacity-figure'), described: say('capacity-figure-described'),
      draw: (width) => chanceByMonth(answer.lines.map((line) => ({ label: lineName(app, answer, line), shares: line.passed_by })), { width, words: app.words }),
      data: table(app, {
        name: 'capacity-by-month', caption: say('capacity-by-month'),
        rows: answer.months.map((ends, i) => ({ ends, i })),
        columns: [
          { heading: say('on-day'), show: (row) => day(row.ends), text: true },
          ...answer.lines.flatMap((line) => [
            { heading: say('line-need', { name: lineName(app, answer, line) }), show: (row) => decimal(line.need[row.i], 0), full: (row) => line.need[row.i] },
            { heading: say('line-passed-in'), show: (row) => percent(line.passed_in[row.i], 0), full: (row) => line.passed_in[row.i] },
            { heading: say('line-passed-by'), show: (row) => percent(line.passed_by[row.i], 0), full: (row) => line.passed_by[row.i] },
          ]),
        ],
      }),
    }),
    table(app, {
      name: 'capacity', caption: say('capacity-caption'), rows: answer.lines, note: say('capacity-note'),
      columns: [
        { heading: say('line-name'), show: (row) => lineName(app, answer, row), text: true },
        { heading: say('line-limit'), show: (row) => count(row.limit), full: (row) => row.limit },
        { heading: say('line-need-now'), show: (row) => decimal(row.need[0], 0), full: (row) => row.need[0] },
        { heading: say('line-need-last'), show: (row) => decimal(row.need.at(-1), 0), full: (row) => row.need.at(-1) },
        { heading: say('line-unlikely'), show: (row) => month(row.unlikely_month), full: (row) => plain(row.unlikely_month) },
        { heading: say('line-likely'), show: (row) => month(row.likely_month), full: (row) => plain(row.likely_month) },
        { heading: say('line-passed-by-end'), show: (row) => percent(row.passed_by.at(-1), 0), full: (row) => row.passed_by.at(-1) },
      ],
    }),
    beds.length ? table(app, {
      name: 'beds', caption: say('beds-caption'), note: say('beds-note'),
      rows: beds.flatMap((line) => ['now', 'last'].map((at) => ({ line, at, ...line.beds[at] }))),
      columns: [
        { heading: say('line-name'), show: (row) => lineName(app, answer, row.line), text: true },
        { heading: say('beds-when'), show: (row) => say(`beds-${row.at}`), text: true },
        { heading: say('beds-mean'), show: (row) => decimal(row.mean, 1), full: (row) => row.mean },
        { heading: say('beds-busy'), show: (row) => count(row.busy), full: (row) => row.busy },
        { heading: say('beds-utilisation'), show: (row) => percent(row.utilisation, 0), full: (row) => row.utilisation },
      ],
    }) : null,
  ];
}

function costPart(app, answer) {
  const { say, count, decimal, day } = app.words;
  if (!answer.cost) return [];
  const [total] = answer.totals;
  const rows = answer.years.map(({ ends }, i) => ({ ends, band: answer.cost[i] }));
  return [
    h('p', { class: 'sentence' }, say('cost-sentence', {
      years: answer.years.length, percent: decimal(total.percent, 0), value: count(total.cost.value),
      lower: count(total.cost.p95[0]), upper: count(total.cost.p95[1]),
    })),
    figure(app, {
      name: 'cost', title: say('cost-figure'), described: say('cost-figure-described'),
      draw: (width) => yearRanges(answer.cost, { width, words: app.words }),
    }),
    table(app, {
      name: 'cost', caption: say('cost-caption'), rows,
      columns: [{ heading: say('year-to'), show: (row) => day(row.ends), text: true }, ...bandColumns(app, say('cost'), (row) => row.band)],
    }),
    table(app, {
      name: 'cost-totals', caption: say('cost-totals-caption'), rows: answer.totals, note: say('cost-totals-note'),
      columns: [
        { heading: say('discount'), show: (row) => say('in-percent', { percent: decimal(row.percent, 0) }), full: (row) => row.percent },
        ...bandColumns(app, say('cost'), (row) => row.cost),
      ],
    }),
  ];
}

function itemTable(app, answer, item, position) {
  const { say, count, day } = app.words;
  const costs = item.cost.some(({ value }) => value > 0);
  return table(app, {
    name: `item-${position + 1}`, rows: answer.years.map(({ ends }, i) => ({ ends, i })),
    caption: item.unit ? say('item-caption-unit', { name: item.name, unit: item.unit }) : say('item-caption', { name: item.name }),
    columns: [
      { heading: say('year-to'), show: (row) => day(row.ends), text: true },
      ...bandColumns(app, say('amount'), (row) => item.amount[row.i]),
      ...(costs ? [{ heading: say('cost'), show: (row) => count(item.cost[row.i].value), full: (row) => item.cost[row.i].value },
        { heading: say('band-95'), show: (row) => say('from-to', { lower: count(item.cost[row.i].p95[0]), upper: count(item.cost[row.i].p95[1]) }), full: (row) => item.cost[row.i].p95.join(' ') }] : []),
    ],
  });
}

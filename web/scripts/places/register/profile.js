/** How good the register is: newcomers by month, what is missing, heaped days and ages, completeness of follow-up. */
import { countedBars } from '../../charts/counted_bars.js';
import { answerBlock } from '../../parts/answer.js';
import { selectOne } from '../../parts/choices.js';
import { h, written } from '../../parts/element.js';
import { figure } from '../../parts/figure.js';
import { live } from '../../parts/live.js';
import { groupings } from '../../parts/question.js';
import { cautionList, covariateName } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { requestOf } from './reader.js';

const ENDINGS = ['under_care', 'died', 'lost', 'known'];

/** @param {import('../../app.js').App} app */
export function profileBlock(app) {
  return answerBlock(app, {
    id: 'profile',
    title: 'profile-title',
    empty: 'findings-empty',
    choices: siteChoice(app),
    ask: ({ cohort, profile }) => cohort && cohort.n > 0 && {
      task: 'register.profile',
      request: { ...requestOf(cohort.reading), site: cohort.covariates.some(({ id }) => id === profile.site) ? profile.site : null },
    },
    draw: (answer) => [
      ...completeness(app, answer.completeness),
      newcomers(app, answer.months),
      missing(app, answer),
      ...days(app, 'start', answer.start_days),
      ...days(app, 'end', answer.end_days),
      ...ages(app, answer.ages),
      cautionList(app, answer.cautions),
      h('p', { class: 'method' }, app.words.say('profile-method')),
    ],
  });
}

function siteChoice(app) {
  return live(app, ({ cohort, profile }) => [cohort?.serial, profile.site], (state) => {
    if (!state.cohort) return [];
    const { say } = app.words;
    const groups = groupings(state).filter(({ id }) => /^c\d+$/.test(id));
    return [h('div', { class: 'choices' }, selectOne({
      id: 'profile-site', label: say('profile-site'), value: state.profile.site ?? '',
      options: [{ value: '', label: say('profile-no-site') }, ...groups.map(({ id }) => ({ value: id, label: covariateName(app, id) }))],
      onchange: (site) => app.store.amend('profile', { site: site || null }),
    }))];
  });
}

function completeness(app, { everyone, by_year: years, by_site: sites }) {
  const { say, percent } = app.words;
  const rows = [
    ...years.map((each) => ({ ...each, name: String(each.group) })),
    { ...everyone, name: say('everyone') },
  ];
  return [
    h('p', { class: 'sentence' }, say('completeness-sentence', { index: percent(everyone.index), known: percent(everyone.with_known) })),
    indexTable(app, 'completeness-by-year', say('completeness-by-year'), say('completeness-year'), rows),
    sites.length ? indexTable(app, 'completeness-by-site', say('completeness-by-site'), say('group'), sites.map((each) => ({ ...each, name: each.group }))) : null,
  ];
}

function indexTable(app, name, caption, heading, rows) {
  const { say, count, percent, decimal } = app.words;
  const years = (dayCount) => decimal(dayCount / 365.25, 1);
  return table(app, {
    name, caption, rows,
    columns: [
      { heading, show: (row) => written(row.name), full: (row) => row.name, text: true },
      { heading: say('patients'), show: (row) => count(row.n), full: (row) => row.n },
      { heading: say('completeness-observed'), show: (row) => years(row.observed_days), full: (row) => row.observed_days / 365.25 },
      { heading: say('completeness-possible'), show: (row) => years(row.possible_days), full: (row) => row.possible_days / 365.25 },
      { heading: say('completeness-index'), show: (row) => percent(row.index), full: (row) => row.index },
      { heading: say('completeness-known'), show: (row) => percent(row.with_known), full: (row) => row.with_known },
    ],
  });
}

function newcomers(app, months) {
  const { say, count } = app.words;
  return figure(app, {
    name: 'newcomers-by-month', title: say('profile-newcomers'), described: say('profile-newcomers-described', { months: months.length }),
    draw: (width) => countedBars({
      bars: months.map(({ month, count: n }) => ({ label: month, count: n })), named: (month) => months.length < 13 || month.endsWith('-01'),
    }, { width, words: app.words, roomForLabel: 64 }),
    data: table(app, {
      name: 'newcomers-by-month', caption: say('profile-newcomers'), rows: months,
      columns: [
        { heading: say('profile-month'), show: (row) => row.month, text: true },
        { heading: say('newcomers'), show: (row) => count(row.count), full: (row) => row.count },
      ],
    }),
  });
}

function missing(app, { missing: columns }) {
  const { say, count, percent } = app.words;
  const share = (n, of) => (of ? n / of : null);
  return table(app, {
    name: 'missing', caption: say('profile-missing'), rows: columns, note: say('profile-missing-note'),
    columns: [
      { heading: say('column-heading'), show: (row) => written(row.heading || row.column), full: (row) => row.heading || row.column, text: true },
      { heading: say('profile-missing-cells'), show: (row) => count(row.missing), full: (row) => row.missing },
      { heading: say('share'), show: (row) => percent(share(row.missing, row.n)), full: (row) => share(row.missing, row.n) },
      ...ENDINGS.map((ending, i) => ({
        heading: say(`profile-ending-${ending}`),
        show: (row) => percent(share(row.by_ending[i].missing, row.by_ending[i].n)),
        full: (row) => share(row.by_ending[i].missing, row.by_ending[i].n),
      })),
    ],
  });
}

/** Days of the month, with how often each should stand there by chance. */
function days(app, which, rows) {
  const { say, count, decimal, percent } = app.words;
  const n = rows.reduce((sum, row) => sum + row.count, 0);
  if (!n) return [];
  const most = rows.reduce((a, b) => (b.count / b.expected > a.count / a.expected ? b : a));
  return [
    h('p', { class: 'sentence' }, say(`profile-days-${which}`, { day: most.day, share: percent(most.count / n), expected: percent(most.expected / n) })),
    figure(app, {
      name: `days-of-${which}`, title: say(`profile-days-${which}-title`), described: say('profile-days-described', { day: most.day }),
      draw: (width) => countedBars({ bars: rows.map((row) => ({ label: String(row.day), count: row.count, expected: row.expected })) }, { width, words: app.words, roomForLabel: 24 }),
      data: table(app, {
        name: `days-of-${which}`, caption: say(`profile-days-${which}-title`), rows,
        columns: [
          { heading: say('profile-day'), show: (row) => count(row.day), full: (row) => row.day },
          { heading: say('rows'), show: (row) => count(row.count), full: (row) => row.count },
          { heading: say('profile-expected'), show: (row) => decimal(row.expected, 1), full: (row) => row.expected },
        ],
      }),
    }),
  ];
}

function ages(app, found) {
  if (!found) return [];
  const { say, count, percent, decimal, estimate } = app.words;
  const rows = found.digits.map((n, digit) => ({ digit, n }));
  const index = { value: found.whipple, lower: found.lower, upper: found.upper };
  return [
    h('p', { class: 'sentence' }, say(found.written ? 'profile-ages' : 'profile-ages-from-birth', { index: estimate(index, (number) => decimal(number, 0)), n: found.n })),
    figure(app, {
      name: 'last-digits-of-ages', title: say('profile-ages-title'), described: say('profile-ages-described'),
      draw: (width) => countedBars({ bars: rows.map(({ digit, n }) => ({ label: String(digit), count: n, expected: found.n / 10 })) }, { width, words: app.words }),
      data: table(app, {
        name: 'last-digits-of-ages', caption: say('profile-ages-title'), rows,
        columns: [
          { heading: say('profile-digit'), show: (row) => count(row.digit), full: (row) => row.digit },
          { heading: say('patients'), show: (row) => count(row.n), full: (row) => row.n },
          { heading: say('share'), show: (row) => percent(row.n / found.n), full: (row) => row.n / found.n },
        ],
      }),
    }),
  ];
}

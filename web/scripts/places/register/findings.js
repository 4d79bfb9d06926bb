/** What may be wrong in the register: each finding with its repair, what that would change, and the log of what was repaired. */
import { answerBlock } from '../../parts/answer.js';
import { h } from '../../parts/element.js';
import { cautionList, named } from '../../parts/said.js';
import { table } from '../../parts/table.js';
import { correctionsTable, saidChange } from './corrections.js';
import { requestOf } from './reader.js';

const MOST_LINES = 8;

/** @param {import('../../app.js').App} app */
export function findingsBlock(app) {
  const pressed = { id: null };
  const opened = new Set();
  const decide = (id, code, declined) => {
    pressed.id = id;
    const { [code]: _, ...others } = app.store.state.reading.repairs;
    app.store.amend('reading', { repairs: declined === null ? others : { ...others, [code]: declined } });
  };
  return answerBlock(app, {
    id: 'findings',
    title: 'findings-title',
    empty: 'findings-empty',
    ask: ({ cohort }) => cohort && { task: 'register.findings', request: requestOf(cohort.reading) },
    draw: (answer) => {
      returnTo(pressed);
      const rows = answer.findings.filter(({ repair }) => repair).map((finding) => rowByRow(app, finding, decide, opened));
      return drawn(app, answer, (finding) => decisionTick(app, finding, decide), rows);
    },
    paper: (answer) => drawn(app, answer, (finding) => h('div', { class: 'decided' }, decided(app, finding)), []),
  });
}

/** After the answer is drawn anew, the keyboard is where it was. */
function returnTo(pressed) {
  if (!pressed.id) return;
  const { id } = pressed;
  pressed.id = null;
  setTimeout(() => document.getElementById(id)?.focus());
}

/** @param {(finding: any) => Node} decision shows, or asks, whether a repair is made */
function drawn(app, answer, decision, rowTables) {
  const { say } = app.words;
  if (!answer.findings.length) return [h('p', { class: 'sentence' }, say('findings-none'))];
  return [
    h('p', { class: 'sentence' }, sentence(app, answer)),
    findingsTable(app, answer, decision),
    ...rowTables,
    effectsTable(app, answer),
    correctionsTable(app, answer.corrections),
    cautionList(app, answer.cautions),
    h('p', { class: 'method' }, say('findings-method', { years: answer.years })),
    h('p', { class: 'note' }, say('always-cautions')),
  ];
}

function sentence(app, { findings, corrections, untouched, now, years }) {
  const { say, percent } = app.words;
  const repairs = findings.filter(({ repair }) => repair);
  const accepted = repairs.filter(({ repair }) => repair.accepted);
  const found = say('findings-sentence', { n: findings.length, repairs: repairs.length });
  if (!accepted.length) return `${found} ${say('findings-sentence-untouched')}`;
  return `${found} ${say('findings-sentence-accepted', {
    accepted: accepted.length, cells: corrections.length, n: now.n, before: untouched.n, deaths: now.events, deathsBefore: untouched.events,
    years, survival: percent(now.survival.value), survivalBefore: percent(untouched.survival.value),
  })}`;
}

function findingsTable(app, { findings, years }, decision) {
  const { say, count } = app.words;
  return table(app, {
    name: 'findings', caption: say('findings-caption'), rows: findings,
    rowClass: ({ severity }) => `finding-${severity}`,
    columns: [
      {
        heading: say('finding'), text: true,
        show: ({ code, severity, parameters, lines, count: n }) => h('div', {},
          h('strong', {}, say(`finding-${code}-short`)), ' ', h('span', { class: 'severity' }, say(`severity-${severity}`)),
          h('div', {}, say(`finding-${code}`, named(app, parameters))),
          lines.length ? h('div', { class: 'hint' }, onLines(app, lines, n)) : null),
        full: ({ code }) => say(`finding-${code}-short`),
      },
      { heading: say('rows'), show: ({ count: n }) => count(n), full: ({ count: n }) => n },
      {
        heading: say('repair'), text: true,
        show: (finding) => proposal(app, finding, years, decision),
        full: ({ repair }) => (repair ? say(`repair-${repair.kind}`) : ''),
      },
    ],
  });
}

function onLines(app, lines, n) {
  const shown = lines.slice(0, MOST_LINES).map((line) => app.words.count(line));
  return app.words.say('finding-lines', { n: lines.length, lines: n > MOST_LINES ? [...shown, '…'] : shown });
}

function proposal(app, finding, years, decision) {
  const { say } = app.words;
  const { repair, severity } = finding;
  if (!repair) return severity === 'slight' ? '' : h('div', { class: 'hint' }, say('repair-none'));
  return h('div', {}, say(`repair-${repair.kind}`), h('div', { class: 'hint' }, effect(app, repair, years)), decision(finding));
}

function decided(app, { repair }) {
  return app.words.say(repair.accepted ? 'repair-accepted' : 'repair-not-accepted');
}

/** What accepting would change, or declining: only the numbers that move. */
function effect(app, repair, years) {
  const { say, count, percent } = app.words;
  const { without, with: mended } = repair;
  const moved = [
    ['n', count(without.n), count(mended.n)],
    ['events', count(without.events), count(mended.events)],
    ['lost', count(without.lost), count(mended.lost)],
    ['survival', percent(without.survival.value), percent(mended.survival.value)],
  ].filter(([, before, after]) => before !== after)
    .map(([what, before, after]) => say(`effect-${what}`, { before, after, years }));
  const ways = repair.alternatives.map(({ kind, headline }) => say(`repair-${kind}-effect`, { years, survival: percent(headline.survival.value), deaths: headline.events }));
  const said = [...(moved.length ? moved : [say('effect-nothing')]), ...ways].join(' ');
  return repair.overruled ? `${said} ${say('effect-overruled', { n: repair.overruled })}` : said;
}

function decisionTick(app, { code, repair }, decide) {
  const { say } = app.words;
  const id = `repair-${code}`;
  return h('label', { class: 'tick' },
    h('input', {
      type: 'checkbox', id, checked: repair.accepted, 'aria-label': say('repair-accept-of', { finding: say(`finding-${code}-short`) }),
      onchange: (event) => decide(id, code, event.target.checked ? [] : null),
    }), ' ', say('repair-accept'));
}

/** Every row of a repair, to be taken or left alone. */
function rowByRow(app, { code, repair }, decide, opened) {
  const { say, count } = app.words;
  const tick = (row) => {
    const id = `repair-${code}-${row.line}`;
    return h('input', {
      type: 'checkbox', id, checked: repair.accepted && !row.declined, disabled: !repair.accepted,
      'aria-label': say('repair-accept-row', { line: row.line }),
      onchange: (event) => {
        const declined = (app.store.state.reading.repairs[code] ?? []).filter((line) => line !== row.line);
        decide(id, code, event.target.checked ? declined : [...declined, row.line]);
      },
    });
  };
  const shown = h('details', {
    class: 'behind', open: opened.has(code), 'data-screen-only': true,
    ontoggle: (event) => (event.target.open ? opened.add(code) : opened.delete(code)),
  },
  h('summary', {}, say('row-by-row', { finding: say(`finding-${code}-short`), n: repair.units })),
  repair.accepted ? null : h('p', { class: 'hint' }, say('row-by-row-hint')),
  table(app, {
    name: `repair-${code}`, caption: say('row-by-row-caption', { finding: say(`finding-${code}-short`) }), rows: repair.listed,
    note: repair.units > repair.listed.length ? say('row-by-row-first', { listed: repair.listed.length, n: repair.units }) : null,
    columns: [
      { heading: say('line'), show: (row) => count(row.line), full: (row) => row.line },
      { heading: say('change'), text: true, show: (row) => h('div', {}, row.changes.map((change) => h('div', {}, saidChange(app, change, row.line)))) },
      { heading: say('decision'), text: true, show: tick, full: (row) => say(repair.accepted && !row.declined ? 'repair-accepted' : 'repair-not-accepted') },
    ],
  }));
  return shown;
}

/** The figures behind what is said of each repair. */
function effectsTable(app, { findings, years }) {
  const { say, count, percent } = app.words;
  const rows = findings.filter(({ repair }) => repair);
  if (!rows.length) return null;
  /** @returns {import('../../parts/table.js').Column<any>[]} */
  const pair = (what, read, write) => ['without', 'with'].map((side) => ({
    heading: say(`effects-${what}-${side}`, { years }), show: ({ repair }) => write(read(repair[side])), full: ({ repair }) => read(repair[side]),
  }));
  return h('details', { class: 'behind' }, h('summary', {}, say('effects-summary')), table(app, {
    name: 'repairs', caption: say('effects-caption'), rows,
    columns: [
      { heading: say('finding'), show: ({ code }) => say(`finding-${code}-short`), text: true },
      ...pair('n', ({ n }) => n, count),
      ...pair('events', ({ events }) => events, count),
      ...pair('lost', ({ lost }) => lost, count),
      ...pair('survival', ({ survival }) => survival.value, percent),
    ],
  }));
}

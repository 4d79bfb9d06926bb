/** Which column is what, with the evidence, and how its dates are written. */
import { h, written } from '../../parts/element.js';
import { live } from '../../parts/live.js';
import { named } from '../../parts/said.js';
import { DATE_ROLES } from './reader.js';

const ROLES = ['none', 'patient_number', 'name', 'start', 'observed_from', 'end', 'death_date', 'outcome', 'sex', 'birth_date', 'age', 'group'];
/** Roles that only one column can have. */
const SINGLE = ROLES.filter((role) => !['none', 'name', 'group', 'end'].includes(role));

/** @param {import('../../app.js').App} app */
export function columnsBlock(app) {
  return live(app, (state) => [state.source?.fingerprint, state.source?.sheet, state.source?.header_line, state.reading.roles, state.reading.date_orders, state.reading.calendars], (state) => {
    const { say } = app.words;
    const { source, reading } = state;
    return [h('section', { 'aria-labelledby': 'columns-heading' },
      h('h2', { id: 'columns-heading' }, say('columns-title')),
      h('p', {}, say('columns-lead')),
      h('div', { class: 'scroll', tabindex: 0, role: 'region', 'aria-label': say('columns-caption') },
        h('table', { class: 'with-choices' },
          h('caption', {}, say('columns-caption')),
          h('thead', {}, h('tr', {}, ['column-heading', 'column-looks', 'column-role'].map((key) =>
            h('th', { scope: 'col', class: 'text' }, say(key))))),
          h('tbody', {}, source.columns.map((column) => row(app, column, reading))))),
      h('p', { class: 'note' }, say('columns-dropped')))];
  });
}

function row(app, column, reading) {
  const role = reading.roles[column.id] ?? 'none';
  return h('tr', { class: role === 'none' ? 'unused' : null },
    h('th', { scope: 'row', class: 'text' }, written(column.heading || app.words.say('column-unnamed', { position: column.position + 1 }))),
    h('td', { class: 'text' }, looks(app, column)),
    h('td', { class: 'text' },
      roleSelect(app, column, role),
      DATE_ROLES.includes(role) && column.dates ? [orderChoice(app, column, reading), calendarChoice(app, column, reading)] : null));
}

/** Evidence as sentences, then some of what stands in the column. */
function looks(app, column) {
  const { say } = app.words;
  const evidence = column.evidence.map(({ code, parameters }) => say(`evidence-${code}`, named(app, parameters))).join(' ');
  return [
    evidence ? h('div', {}, evidence) : null,
    h('div', { class: 'samples' }, column.samples.slice(0, 3).flatMap((sample, i) => [i ? ' · ' : '', written(sample)])),
  ];
}

function roleSelect(app, column, role) {
  const { say } = app.words;
  return h('select', {
    id: `role-${column.id}`, 'aria-label': say('role-of', { column: column.heading }),
    onchange: (event) => giveRole(app, column.id, event.target.value),
  }, ROLES.map((each) => h('option', { value: each, selected: each === role }, say(`role-${each}`))));
}

/** A role that only one column can have is taken from the column that had it. */
function giveRole(app, id, role) {
  const { reading } = app.store.state;
  const roles = { ...reading.roles };
  if (SINGLE.includes(role)) {
    for (const [other, had] of Object.entries(roles)) if (had === role) roles[other] = 'none';
  }
  app.store.amend('reading', { roles: { ...roles, [id]: role } });
}

/** The calendar is only asked for where somebody opens it: most registers are Gregorian, or Buddhist, which shows by itself. */
function calendarChoice(app, column, reading) {
  const { say } = app.words;
  const chosen = reading.calendars[column.id] ?? 'gregorian';
  return h('details', { class: 'calendar', open: chosen !== 'gregorian' }, h('summary', {}, say('calendar-title')),
    h('select', {
      id: `calendar-${column.id}`, 'aria-label': say('calendar-of', { column: column.heading }),
      onchange: (event) => {
        const { [column.id]: _, ...others } = app.store.state.reading.calendars;
        const { value } = event.target;
        app.store.amend('reading', { calendars: value === 'gregorian' ? others : { ...others, [column.id]: value } });
      },
    }, CALENDARS.map((calendar) => h('option', { value: calendar, selected: calendar === chosen }, say(`calendar-${calendar}`)))));
}

const CALENDARS = ['gregorian', 'ethiopian', 'persian', 'hijri', 'bikram_sambat'];

function orderChoice(app, column, reading) {
  const { say, has } = app.words;
  const chosen = reading.date_orders[column.id] ?? '';
  const name = (order) => (has(`order-${order}`) ? say(`order-${order}`) : order);
  if (column.dates.settled || column.dates.choices.length < 2) {
    return h('p', { class: 'hint' }, say('order-settled', { order: name(column.dates.order) }));
  }
  return h('div', {},
    h('label', { for: `order-${column.id}` }, say('order-ask')),
    h('select', {
      id: `order-${column.id}`,
      onchange: (event) => app.store.amend('reading', { date_orders: { ...app.store.state.reading.date_orders, [column.id]: event.target.value } }),
    }, h('option', { value: '' }, say('choose')), column.dates.choices.map((order) =>
      h('option', { value: order, selected: order === chosen }, name(order)))));
}

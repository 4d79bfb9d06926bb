/** What each value of the outcome column, and of the sex column, means. */
import { h, written } from '../../parts/element.js';
import { live } from '../../parts/live.js';

const MEANINGS = [
  'under_care', 'died_of_disease', 'died_of_other_cause', 'died_cause_unknown', 'recovered', 'moved_away', 'lost', 'stopped',
];
const SEXES = ['female', 'male', 'other'];

/** @param {import('../../app.js').App} app */
export function meaningsBlock(app) {
  return valuesBlock(app, {
    role: 'outcome', id: 'meanings', choices: MEANINGS, word: 'meaning', field: 'meanings',
    blank: (reading) => ({ value: reading.blank_meaning, change: (meaning) => app.store.amend('reading', { blank_meaning: meaning || null }) }),
  });
}

/** @param {import('../../app.js').App} app */
export function sexesBlock(app) {
  return valuesBlock(app, { role: 'sex', id: 'sexes', choices: SEXES, word: 'sex', field: 'sexes', blank: null });
}

function columnWith(state, role) {
  return Object.entries(state.reading.roles).find(([, had]) => had === role)?.[0] ?? null;
}

/** A table of values, how often each stands there, and a choice of what it means. */
function valuesBlock(app, { role, id, choices, word, field, blank }) {
  const select = (state) => {
    const column = columnWith(state, role);
    return [column, column && state.values[column], state.reading[field], state.reading.blank_meaning];
  };
  return live(app, select, (state) => {
    const column = columnWith(state, role);
    const known = column && state.values[column];
    if (!known) return [];
    const { say, count } = app.words;
    const options = (value) => [
      h('option', { value: '' }, say(`${word}-none`)),
      ...choices.map((each) => h('option', { value: each, selected: each === value }, say(`${word}-${each}`))),
    ];
    const line = (label, number, control) => h('tr', {},
      h('th', { scope: 'row', class: 'text' }, label), h('td', { class: 'number' }, count(number)), h('td', { class: 'text' }, control));
    const rows = known.values.map(({ value, count: number, like }, i) => line(spelt(app, value, like), number,
      h('select', {
        id: `${id}-${i}`, 'aria-label': say('meaning-of', { value }),
        onchange: (event) => app.store.amend('reading', { [field]: without(app.store.state.reading[field], value, event.target.value) }),
      }, options(state.reading[field][value]))));
    if (blank && known.blank > 0) {
      const { value, change } = blank(state.reading);
      rows.push(line(say('blank-value'), known.blank, h('select', {
        id: `${id}-blank`, 'aria-label': say('meaning-of', { value: say('blank-value') }), onchange: (event) => change(event.target.value),
      }, options(value))));
    }
    return [h('section', { 'aria-labelledby': `${id}-heading` },
      h('h2', { id: `${id}-heading` }, say(`${id}-title`)),
      h('p', {}, say(`${id}-lead`)),
      h('div', { class: 'scroll', tabindex: 0, role: 'region', 'aria-label': say(`${id}-title`) },
        h('table', { class: 'with-choices' },
          h('caption', {}, say(`${id}-caption`)),
          h('thead', {}, h('tr', {},
            h('th', { scope: 'col', class: 'text' }, say('value')), h('th', { scope: 'col', class: 'number' }, say('rows')),
            h('th', { scope: 'col', class: 'text' }, say('means')))),
          h('tbody', {}, rows))))];
  });
}

/** A value, and the more frequent one that it is probably a misspelling of. */
function spelt(app, value, like) {
  return like ? h('div', {}, written(value), h('div', { class: 'hint' }, app.words.say('value-like', { value: like }))) : written(value);
}

/** The mapping with one value given a meaning, or none. */
function without(mapping, value, meaning) {
  const { [value]: _, ...others } = mapping;
  return meaning ? { ...others, [value]: meaning } : others;
}

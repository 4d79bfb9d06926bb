/** Form controls with their labels. Each takes the current value and tells of a change. */
import { h } from './element.js';

/**
 * @typedef {{ id: string, label: string, hint?: string, fault?: string }} Naming
 *   `fault` is a sentence saying what is wrong with the value now
 */

/** A control under its label, with its hint and its fault tied to it. @param {Naming} naming @param {HTMLElement} control */
function labelled({ id, label, hint, fault }, control) {
  const described = [hint && `${id}-hint`, fault && `${id}-fault`].filter(Boolean).join(' ');
  if (described) control.setAttribute('aria-describedby', described);
  if (fault) control.setAttribute('aria-invalid', 'true');
  return h('div', { class: 'choice' },
    h('label', { for: id }, label),
    control,
    hint && h('p', { class: 'hint', id: `${id}-hint` }, hint),
    fault && h('p', { class: 'fault', id: `${id}-fault` }, fault));
}

/**
 * One of several.
 * @param {Naming & { options: Array<{value: string, label: string}>, value: string|null, onchange: (value: string) => void }} choice
 */
export function selectOne(choice) {
  const control = h('select', { id: choice.id, onchange: (event) => choice.onchange(event.target.value) },
    choice.options.map(({ value, label }) => h('option', { value, selected: value === (choice.value ?? '') }, label)));
  return labelled(choice, control);
}

/**
 * A number; an empty field is null. The browser's own bounds and step are used, and the
 * engine checks again.
 * @param {Naming & { value: number|null, least?: number, greatest?: number, step?: number|'any', unit?: string, onchange: (value: number|null) => void }} choice
 */
export function numberField(choice) {
  const control = h('input', {
    id: choice.id, type: 'number', inputmode: 'decimal', value: choice.value ?? '',
    min: choice.least, max: choice.greatest, step: choice.step ?? 'any',
    onchange: (event) => choice.onchange(event.target.value === '' ? null : event.target.valueAsNumber),
  });
  const field = choice.unit ? h('span', { class: 'with-unit' }, control, h('span', { class: 'unit' }, choice.unit)) : null;
  const whole = labelled(choice, control);
  if (field) {
    control.replaceWith(field);
    field.prepend(control);
  }
  return whole;
}

/**
 * A line of text.
 * @param {Naming & { value: string, type?: 'text'|'date', onchange: (value: string) => void }} choice
 */
export function textField(choice) {
  return labelled(choice, h('input', {
    id: choice.id, type: choice.type ?? 'text', value: choice.value, autocomplete: 'off',
    onchange: (event) => choice.onchange(event.target.value),
  }));
}

/**
 * Any number of several, as ticks under one legend.
 * @param {{ id: string, legend: string, hint?: string, options: Array<{value: string, label: string|Node}>, values: string[], onchange: (values: string[]) => void }} choice
 */
export function tickSeveral({ id, legend, hint, options, values, onchange }) {
  const ticked = new Set(values);
  const boxes = options.map(({ value, label }, position) =>
    h('label', { class: 'tick' },
      h('input', {
        type: 'checkbox', id: `${id}-${position}`, checked: ticked.has(value),
        onchange: (event) => {
          if (event.target.checked) ticked.add(value);
          else ticked.delete(value);
          onchange(options.map((option) => option.value).filter((each) => ticked.has(each)));
        },
      }),
      ' ', label));
  return h('fieldset', { class: 'choice' }, h('legend', {}, legend), hint && h('p', { class: 'hint' }, hint), h('div', { class: 'ticks' }, boxes));
}

/** Choices side by side where there is room. */
export function choiceRow(...choices) {
  return h('div', { class: 'choices' }, choices);
}

/** A button that does something on this page. */
export function button(label, onclick, attributes = {}) {
  return h('button', { type: 'button', onclick, ...attributes }, label);
}

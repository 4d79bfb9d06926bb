/** Everything typed on this place as a small file without patients, and back again. */
import { button } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { live } from '../../parts/live.js';
import { save } from '../../parts/save.js';
import { beginnings } from '../../store.js';
import { EVENTS, blankItem, blankLine } from './items.js';
import { LEVERS, blankLever } from './levers_form.js';
import { BASES, TAILS } from './request.js';

const FORMAT = 'vitalroll-caseload';
const VERSION = 1;
const MOST_ROWS = 99;
/** Nobody types more; anything larger was not saved from here. */
const MOST_BYTES = 1_000_000;
/** Rows of each list, by what an empty one holds; fields that may be left empty are null there. */
const LISTS = { items: blankItem, lines: blankLine, levers: blankLever };

/** Fields that take one of several words. */
const CHOICES = { basis: BASES, tail: TAILS, event: EVENTS, kind: LEVERS, among: ['population', 'patients'], goal: ['under_care', 'lost', 'deaths', 'cost'] };

/** @param {import('../../app.js').App} app */
export function scenarioFile(app) {
  /** @type {{levers: number, items: number}|'strange'|null} */
  let opened = null;
  let serial = 0;
  const box = live(app, () => serial, () => {
    const { say } = app.words;
    return [
      h('h2', { id: 'scenario-file-heading' }, say('scenario-file-title')),
      h('p', {}, say('scenario-file-lead')),
      h('p', {}, button(say('scenario-file-save'), () => save('caseload-scenarios.json', 'application/json', scenarioText(app.store.state.caseload)), { id: 'scenario-save', class: 'plain' })),
      h('p', {}, h('label', { for: 'scenario-open' }, say('scenario-file-open')), ' ',
        h('input', { id: 'scenario-open', type: 'file', accept: '.json,application/json', onchange: (event) => open(event) })),
      h('div', { 'aria-live': 'polite' }, outcome(say)),
    ];
  }, { id: 'scenario-file' });

  function outcome(say) {
    if (opened === null) return null;
    if (opened === 'strange') return h('p', { class: 'refusal', role: 'alert' }, say('scenario-file-strange'));
    return h('p', { class: 'note' }, say('scenario-file-opened', opened));
  }

  async function open(event) {
    const [file] = event.target.files;
    event.target.value = '';
    if (!file) return;
    const caseload = file.size > MOST_BYTES ? null : readScenario(await file.text());
    opened = caseload ? { levers: caseload.levers.length, items: caseload.items.length } : 'strange';
    serial += 1;
    if (caseload) app.store.change({ caseload });
    else app.store.settle({});
  }

  return h('section', { 'aria-labelledby': 'scenario-file-heading', 'data-screen-only': true }, box);
}

/** @param {object} caseload */
export function scenarioText(caseload) {
  return `${JSON.stringify({ format: FORMAT, version: VERSION, caseload }, null, 2)}\n`;
}

/**
 * The choices in a saved file, or null when it is strange. Only names and kinds known here are taken.
 * @param {string} text
 */
export function readScenario(text) {
  let file;
  try {
    file = JSON.parse(text);
  } catch {
    return null;
  }
  if (file?.format !== FORMAT || file.version !== VERSION || typeof file.caseload !== 'object' || file.caseload === null) return null;
  const empty = beginnings('').caseload;
  const read = likeness(empty, file.caseload);
  if (!read) return null;
  for (const [name, blank] of Object.entries(LISTS)) {
    const rows = file.caseload[name];
    if (!Array.isArray(rows) || rows.length > MOST_ROWS) return null;
    read[name] = rows.map((row) => likeness(blank(), row));
    if (read[name].includes(null)) return null;
  }
  read.breakEven = likeness(empty.breakEven, file.caseload.breakEven);
  return read.breakEven && read;
}

/**
 * The fields of `like` with the values of `given`, or null when one is of another kind.
 * @returns {any}
 */
function likeness(like, given) {
  if (typeof given !== 'object' || given === null) return null;
  const found = {};
  for (const [name, value] of Object.entries(like)) {
    if (typeof value === 'object' && value !== null) continue;
    const other = given[name] ?? null;
    const fine = typeof value === 'string' ? typeof other === 'string' : other === null || Number.isFinite(other);
    if (!fine || (name in CHOICES && !CHOICES[name].includes(other))) return null;
    found[name] = other;
  }
  return found;
}

/** What the person types about resources: things that care takes, and how much there is of them. */
import { button, choiceRow, numberField } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { numberFaults, typedGrid } from '../../parts/grid.js';
import { live } from '../../parts/live.js';

export const EVENTS = ['death', 'lost', 'completed', 'stopped', 'moved_away'];
const AMOUNTS = ['at_start', 'first_year', 'later', 'per_event', 'unit_cost'];
const LEAST_GROWTH = -50;
const MOST = 100;

export const blankItem = () => ({ name: '', unit: '', at_start: null, first_year: null, later: null, per_event: null, event: 'death', unit_cost: null, cost_growth: null });
export const blankLine = () => ({ name: '', what: 'patients', limit: null });

/** Invented. @param {(key: string) => string} say */
function example(say) {
  const item = (name, amounts) => ({ ...blankItem(), name: say(`items-example-${name}`), unit: say(`items-example-${name}-unit`), ...amounts });
  return {
    items: [
      item('visits', { at_start: 1, first_year: 1, later: 0.33, unit_cost: 8, cost_growth: 2 }),
      item('medicine', { first_year: 30, later: 30, unit_cost: 0.4, cost_growth: 3 }),
      item('beds', { at_start: 4, first_year: 0.2, later: 0.1, unit_cost: 25, cost_growth: 2 }),
    ],
    lines: [
      { name: say('lines-example-slots'), what: 'amount:0', limit: 320 },
      { name: say('lines-example-ward'), what: 'beds:2', limit: 8 },
    ],
  };
}

/** Everything up to the last row with something in it: lines speak of items by their place. */
export function itemsAsked({ items }) {
  const last = items.findLastIndex((row) => row.name || AMOUNTS.some((name) => row[name]));
  return items.slice(0, last + 1).map((row, i) => ({ name: row.name || String(i + 1), unit: row.unit, event: row.event, ...Object.fromEntries([...AMOUNTS, 'cost_growth'].map((name) => [name, row[name] ?? 0])) }));
}

/** Lines with a limit; each says which item it is about. */
export function linesAsked({ lines }) {
  return lines.filter(({ limit }) => limit !== null).map(({ name, what, limit }) => {
    const [kind, item] = what.split(':');
    return { kind, name, limit, item: item === undefined ? null : Number(item) };
  });
}

/** Whether everything typed can be asked with. */
export function typedFaultless({ items, lines, discount }) {
  const amounts = items.flatMap((row) => AMOUNTS.map((name) => row[name] ?? 0));
  return amounts.every((amount) => amount >= 0) && items.every(({ cost_growth: growth }) => growthIsFine(growth))
    && lines.every(({ limit }) => limit === null || limit > 0)
    && lines.every(({ what }) => what === 'patients' || Number(what.split(':')[1]) < items.length) && discountIsFine(discount);
}

function growthIsFine(growth) {
  return growth === null || (growth >= LEAST_GROWTH && growth <= MOST);
}

function discountIsFine(discount) {
  return discount !== null && discount >= 0 && discount <= MOST;
}

/** @param {import('../../app.js').App} app */
export function itemsForm(app) {
  return live(app, ({ caseload }) => [caseload.items, caseload.lines, caseload.discount], ({ caseload }) => {
    const { say } = app.words;
    const put = (patch) => app.store.amend('caseload', patch);
    const shown = (rows, blank) => (rows.length ? rows : [blank()]);
    const number = (name) => ({ name, heading: say(`item-${name}`), kind: /** @type {const} */ ('number'), least: name === 'cost_growth' ? LEAST_GROWTH : 0 });
    return [
      h('p', {}, say('items-lead')),
      typedGrid(app, {
        id: 'items', caption: say('items-caption'), rows: shown(caseload.items, blankItem),
        current: () => shown(app.store.state.caseload.items, blankItem), blank: blankItem,
        columns: [
          { name: 'name', heading: say('item-name'), kind: 'text' },
          { name: 'unit', heading: say('item-unit'), kind: 'text' },
          number('at_start'), number('first_year'), number('later'), number('per_event'),
          { name: 'event', heading: say('item-event'), kind: 'choice', options: EVENTS.map((event) => ({ value: event, label: say(`event-${event}`) })) },
          number('unit_cost'), number('cost_growth'),
        ],
        faults: (row) => ({
          ...numberFaults(app, row, AMOUNTS, { whole: false }),
          ...(growthIsFine(row.cost_growth) ? {} : { cost_growth: say('fault-between', { least: LEAST_GROWTH, greatest: MOST }) }),
        }),
        onchange: (items) => put({ items }),
      }),
      typedGrid(app, {
        id: 'lines', caption: say('lines-caption'), rows: shown(caseload.lines, blankLine),
        current: () => shown(app.store.state.caseload.lines, blankLine), blank: blankLine,
        columns: [
          { name: 'name', heading: say('line-name'), kind: 'text' },
          { name: 'what', heading: say('line-what'), kind: 'choice', options: whatOptions(say, caseload.items) },
          { name: 'limit', heading: say('line-limit'), kind: 'number', least: 0 },
        ],
        faults: (row) => ({
          ...(row.limit !== null && row.limit <= 0 ? { limit: say('fault-not-above-zero') } : {}),
          ...(row.what !== 'patients' && Number(row.what.split(':')[1]) >= caseload.items.length ? { what: say('fault-item-gone') } : {}),
        }),
        onchange: (lines) => put({ lines }),
      }),
      choiceRow(numberField({
        id: 'discount', label: say('discount'), hint: say('discount-hint'), value: caseload.discount, least: 0, greatest: MOST, unit: say('percent-sign'),
        fault: discountIsFine(caseload.discount) ? null : say('fault-between', { least: 0, greatest: MOST }),
        onchange: (discount) => put({ discount }),
      })),
      h('p', { class: 'actions' },
        button(say('counts-example'), () => put(example(say)), { class: 'plain', id: 'items-example' }),
        button(say('counts-clear'), () => put({ items: [], lines: [] }), { class: 'plain', id: 'items-clear' })),
    ];
  });
}

function whatOptions(say, items) {
  const named = items.map(({ name }, i) => ({ i, name: name || say('item-number', { number: i + 1 }) }));
  return [
    { value: 'patients', label: say('line-patients') },
    ...named.map(({ i, name }) => ({ value: `amount:${i}`, label: say('line-amount', { name }) })),
    ...named.map(({ i, name }) => ({ value: `beds:${i}`, label: say('line-beds', { name }) })),
  ];
}

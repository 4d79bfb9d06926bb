/** Opening a register and rebuilding the cohort whenever the person reads it differently. */
import { emptyReading } from '../../store.js';

const PATIENCE_MS = 150;
/** The closing date of the invented demo register. */
const DEMO = { name: 'demo-register.csv', closing: '2025-06-30' };

/** @param {import('../../app.js').App} app */
export function makeReader(app) {
  let serial = 0;
  let built = null;
  let timer = null;

  /**
   * @param {string} name
   * @param {Uint8Array} content
   * @param {{ sheet?: string|null, header_line?: number|null, closing?: string }} [how]
   */
  async function open(name, content, { sheet = null, header_line: headerLine = null, closing = '' } = {}) {
    tell({ busy: true, done: 0, total: 0, refusal: null });
    try {
      const source = await app.engine.ask('register.open', { name, content, sheet, header_line: headerLine }, {
        onProgress: (_, done, total) => tell({ busy: true, done, total, refusal: null }),
      });
      const reading = await proposedReading(source, closing);
      kept = { name, content };
      app.store.change({
        source, reading: reading.reading, values: reading.values, cohort: null, building: null, appliedSettings: null, savedSettings: null,
        opening: { busy: false, done: 0, total: 0, refusal: null },
        question: { ...app.store.state.question, group: null },
        profile: { site: null },
        trace: { ...app.store.state.trace, columns: [] },
        compare: { ...app.store.state.compare, exposed: null, reference: null, covariates: [] },
      });
      app.store.forgetPast();
    } catch (refusal) {
      if (!refusal.code) throw refusal;
      tell({ busy: false, done: 0, total: 0, refusal: plain(refusal) });
    }
  }

  /** What was opened, to open it again with another sheet or heading line. */
  let kept = null;

  async function proposedReading(source, closing) {
    const reading = { ...emptyReading(), closing_date: closing };
    for (const column of source.columns) {
      reading.roles[column.id] = column.role;
      if (column.dates?.settled) reading.date_orders[column.id] = column.dates.order;
    }
    const values = {};
    for (const column of source.columns.filter(({ role }) => role === 'outcome' || role === 'sex')) {
      values[column.id] = await app.engine.ask('register.values', { column: column.id });
      addProposals(reading, column.role, values[column.id]);
    }
    return { reading, values };
  }

  /** When the role of a column becomes outcome or sex, its values are needed. */
  async function needValues() {
    const { source, reading, values } = app.store.state;
    if (!source) return;
    const missing = Object.entries(reading.roles)
      .filter(([id, role]) => (role === 'outcome' || role === 'sex') && !(id in values));
    for (const [id, role] of missing) {
      const answer = await app.engine.ask('register.values', { column: id }, { key: `values-${id}` }).catch(() => null);
      if (!answer) continue;
      const next = { ...app.store.state.reading, meanings: { ...app.store.state.reading.meanings }, sexes: { ...app.store.state.reading.sexes } };
      addProposals(next, role, answer);
      app.store.change({ values: { ...app.store.state.values, [id]: answer } });
      app.store.settle({ reading: next });
    }
  }

  /** Build again when the reading is complete and differs from what was built. */
  function rebuild() {
    const { source, reading } = app.store.state;
    if (!app.engine) return;
    needValues();
    if (!source || whatIsMissing(app.store.state).length) {
      if (app.store.state.cohort) app.store.settle({ cohort: null });
      built = null;
      return;
    }
    const key = JSON.stringify([source.fingerprint, source.sheet, source.header_line, reading]);
    if (key === built) return;
    built = key;
    clearTimeout(timer);
    timer = setTimeout(() => build(key, reading), PATIENCE_MS);
  }

  async function build(key, reading) {
    try {
      const cohort = await app.engine.ask('register.build', requestOf(reading), { key: 'register-build' });
      if (key !== built) return;
      serial += 1;
      app.store.settle({ cohort: { ...cohort, serial, reading }, building: null });
    } catch (refusal) {
      if (!refusal.code) throw refusal;
      if (key === built && refusal.code !== 'superseded') app.store.settle({ cohort: null, building: plain(refusal) });
    }
  }

  async function forget() {
    await app.engine.ask('register.forget', {});
    built = null;
    kept = null;
    app.store.change({ source: null, cohort: null, building: null, values: {}, reading: emptyReading(), opening: null, appliedSettings: null, savedSettings: null });
    app.store.forgetPast();
  }

  function tell(opening) {
    app.store.change({ opening });
  }

  app.store.subscribe(rebuild);
  return {
    open,
    openDemo: () => open(DEMO.name, app.demo, { closing: DEMO.closing }),
    /** Open the same file again, read otherwise. */
    again: (how) => open(kept.name, kept.content, { ...how, closing: app.store.state.reading.closing_date }),
    stop: () => app.engine.stop(),
    forget,
  };
}

function addProposals(reading, role, { values }) {
  for (const { value, meaning, sex } of values) {
    if (role === 'outcome' && meaning && !(value in reading.meanings)) reading.meanings[value] = meaning;
    if (role === 'sex' && sex && !(value in reading.sexes)) reading.sexes[value] = sex;
  }
}

/** The request of register.build: only what is chosen, and only the values of chosen columns. */
export function requestOf(reading) {
  const roles = Object.fromEntries(Object.entries(reading.roles).filter(([, role]) => role !== 'none'));
  const orders = Object.fromEntries(Object.entries(reading.date_orders).filter(([id]) => id in roles));
  const calendars = Object.fromEntries(Object.entries(reading.calendars).filter(([id]) => id in roles));
  return { ...reading, roles, date_orders: orders, calendars };
}

/** Keys of what the person still has to choose before a cohort can be built. */
export function whatIsMissing({ source, reading }) {
  const roles = Object.values(reading.roles);
  const missing = ['start', 'outcome'].filter((role) => !roles.includes(role)).map((role) => `missing-${role}`);
  if (!roles.includes('end') && !roles.includes('death_date')) missing.push('missing-end');
  if (!reading.closing_date) missing.push('missing-closing');
  const unsettled = source.columns.some((column) =>
    DATE_ROLES.includes(reading.roles[column.id]) && column.dates && !reading.date_orders[column.id]
    && reading.calendars[column.id] !== 'ethiopian');
  if (unsettled) missing.push('missing-order');
  if (roles.includes('outcome') && !Object.values(reading.meanings).length) missing.push('missing-meanings');
  return missing;
}

export const DATE_ROLES = ['start', 'end', 'observed_from', 'death_date', 'birth_date'];

function plain({ code, parameters, field, line }) {
  return { code, parameters, field, line };
}

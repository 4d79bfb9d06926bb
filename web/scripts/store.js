/**
 * Everything the person has chosen, in one place, with a way back.
 *
 * A place of the page can be built anew from this at any time: after a change of language,
 * after undo, after the engine had to be started again.
 */

/** @typedef {ReturnType<typeof beginnings>} State */

/** What a page that has just been opened holds. */
export function beginnings(language) {
  return {
    language,
    engine: { stage: 'engine-stage-waiting', done: 0, total: 0, ready: false, failure: null, version: null },
    /** Answer of register.open, or null before a register is opened. */
    source: null,
    /** Values of the columns that need meanings, by column: answers of register.values. */
    values: {},
    /** How the person reads the columns; the request of register.build. */
    reading: emptyReading(),
    /** How far opening a file has come, and why it was refused. @type {{busy: boolean, done: number, total: number, refusal: any}|null} */
    opening: null,
    /** Answer of register.apply_settings, its refusal, or null when none were applied. @type {any} */
    appliedSettings: null,
    /** How many values the settings that were saved last leave out, or null. @type {{left: number}|null} */
    savedSettings: null,
    /** Why no cohort could be built, or null. */
    building: null,
    /** Answer of register.build, or null. */
    cohort: null,
    question: { interest: ['died_of_disease', 'died_of_other_cause', 'died_cause_unknown'], group: null },
    outcomes: { interval: 'log-log', step: 'year', ratesBy: 'year', horizon: null, further: 2, lostYears: 3 },
    compare: { exposed: null, reference: null, step: 'year', intervals: 5, weight: 'log_rank', rho: 1, gamma: 0, stratify: null, ordered: false, scores: {}, covariates: [], ties: 'efron', competing: null, known: null, landmarkMonths: null, foundAlike: null },
    caseload: {
      years: 5, basis: 'history', perYear: null, incidence: null, population: null, growth: 0, damping: 0.8,
      completeness: 100, tail: 'held', backYears: 3,
      items: [], lines: [], discount: 3,
      levers: [], budget: 100000, sensitivityOf: 0, breakEven: { kind: 'fewer_lost', goal: 'lost', target: null },
    },
    counts: {
      lifeTable: { entering: null, rows: [] },
      strata: [],
      balance: { prevalent: null, new_per_year: null, leaving: [], years: 5, population: null },
      district: { rows: [], lastAge: 90, years: 10 },
      planning: { question: 'survival_size', typed: {} },
    },
    profile: { site: null },
    trace: { months: 6, withLost: true, columns: [] },
    report: { title: '', hospital: '', author: '', date: '', leftOut: [] },
    /** Changes whenever a piece of the report does. */
    reportSerial: 0,
    /** The place that is shown, by its name in the address. */
    place: 'register',
  };
}

/** A reading of no columns at all. */
export function emptyReading() {
  return { roles: {}, meanings: {}, blank_meaning: null, sexes: {}, date_orders: {}, closing_date: '', repairs: {}, unseen_months: 12, spellings: {}, calendars: {} };
}

/** Parts of the state that are choices: these can be undone. */
const CHOICES = ['reading', 'question', 'outcomes', 'compare', 'caseload', 'counts', 'profile', 'trace', 'report'];
const STEPS_KEPT = 100;

/** @param {State} state */
export function makeStore(state) {
  const listeners = new Set();
  const past = [];

  function tell() {
    for (const listener of [...listeners]) listener(store.state);
  }

  const store = {
    state,

    /**
     * Replace parts of the state. A change of choices can be undone.
     * @param {Partial<State>} parts whole new values for top-level names
     */
    change(parts) {
      if (Object.keys(parts).some((name) => CHOICES.includes(name))) {
        past.push(Object.fromEntries(CHOICES.map((name) => [name, store.state[name]])));
        if (past.length > STEPS_KEPT) past.shift();
      }
      store.state = { ...store.state, ...parts };
      tell();
    },

    /** Replace parts without a step to undo: answers that follow from choices already made. */
    settle(parts) {
      store.state = { ...store.state, ...parts };
      tell();
    },

    /** Change some names inside one top-level part. */
    amend(part, inner) {
      store.change({ [part]: { ...store.state[part], ...inner } });
    },

    canUndo: () => past.length > 0,

    /** Take back the last change of choices. */
    undo() {
      const before = past.pop();
      if (!before) return;
      store.state = { ...store.state, ...before };
      tell();
    },

    /** What has been undone or opened before is not to be returned to (another register was opened). */
    forgetPast() {
      past.length = 0;
      tell();
    },

    /** @returns {() => void} a function that ends the subscription */
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
  return store;
}

/** The engine's codes as sentences. */
import { h } from './element.js';

/**
 * The cautions that must stand beside a number.
 * @param {import('../app.js').App} app
 * @param {Array<{code: string, parameters: Record<string, any>}>} cautions
 */
export function cautionList(app, cautions) {
  if (!cautions?.length) return null;
  const sentences = [...new Set(cautions.map(({ code, parameters }) => app.words.say(`caution-${code}`, named(app, parameters))))];
  return h('ul', { class: 'cautions', 'aria-label': app.words.say('cautions-label') },
    sentences.map((sentence) => h('li', {}, sentence)));
}

/**
 * Why there is no answer, in words.
 * @param {import('../app.js').App} app
 * @param {{code: string, parameters: Record<string, any>, field?: string|null, line?: number|null}} refusal
 */
export function refusalSentence(app, { code, parameters, field, line }) {
  const { say, has } = app.words;
  const key = has(`refusal-${code}`) ? `refusal-${code}` : 'refusal-internal';
  return say(key, { ...named(app, parameters), field: field ?? '', line: line ?? '' });
}

export function refusalNote(app, refusal) {
  return h('p', { class: 'refusal', role: 'alert' }, refusalSentence(app, refusal));
}

/**
 * Meanings, roles, columns and shares among the parameters, by the names people know.
 * @param {import('../app.js').App} app
 * @param {Record<string, any>} [parameters]
 */
export function named(app, parameters = {}) {
  const values = { ...parameters };
  for (const name of ['meaning', 'role', 'order', 'calendar']) {
    const key = `${name}-${values[name]}`;
    if (typeof values[name] === 'string' && app.words.has(key)) values[name] = app.words.say(key);
  }
  // A calendar year is a name, not an amount: no mark between its thousands.
  for (const name of ['year', 'first', 'last']) {
    if (typeof values[name] === 'number') values[name] = String(values[name]);
  }
  for (const name of ['start', 'end', 'birth', 'observed_from', 'last', 'closing']) {
    if (/^\d{4}-\d{2}-\d{2}$/.test(values[name])) values[name] = app.words.day(values[name]);
  }
  for (const name of ['share', 'other_share']) {
    if (typeof values[name] === 'number') values[name] = app.words.percent(values[name], 0);
  }
  // A caution about everybody carries level null.
  if ('level' in values) values.level = levelName(app, app.store.state.question.group, values.level);
  for (const name of ['first', 'second', 'above']) {
    if (typeof values[name] === 'string') values[name] = levelName(app, app.store.state.question.group, values[name]);
  }
  for (const name of ['covariate', 'column', 'group', 'id']) {
    if (typeof values[name] === 'string') values[name] = covariateName(app, values[name]);
  }
  if (Array.isArray(values.covariates)) values.covariates = values.covariates.map((id) => covariateName(app, id)).join(', ');
  return values;
}

/** A covariate or column by its heading in the file, or by our word for a derived one. */
export function covariateName(app, id) {
  const { cohort, source } = app.store.state;
  const known = cohort?.covariates.find((each) => each.id === id) ?? source?.columns.find((each) => each.id === id);
  if (known?.heading) return known.heading;
  return app.words.has(`covariate-${id}`) ? app.words.say(`covariate-${id}`) : id;
}

/** A level of a covariate; sexes and "no group" have our words, everything else is as written. */
export function levelName(app, id, level) {
  if (level === null) return app.words.say('everyone');
  if (id === 'sex' && app.words.has(`sex-${level}`)) return app.words.say(`sex-${level}`);
  return level;
}

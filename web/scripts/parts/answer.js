/** A block that asks the engine, shows the answer, and hands it to the report. */
import { button } from './choices.js';
import { h } from './element.js';
import { refusalNote } from './said.js';

const PATIENCE_MS = 250;
/** After this long it is said how far a question has come, and it can be stopped. */
const LONG_MS = 1500;

const MOST_KEPT = 12;
/** Latest questions with their answers on the way: blocks that ask the same share one. @type {Map<string, Promise<any>>} */
const asked = new Map();

/** How far each question on the way has come; every block that waits for it listens. @type {Map<string, Set<(done: number, total: number) => void>>} */
const listening = new Map();

function askOnce(app, question, key, id) {
  if (!asked.has(key)) {
    const onProgress = (_, done, total) => listening.get(key)?.forEach((hear) => hear(done, total));
    const answer = app.engine.ask(question.task, question.request, { key: id, onProgress });
    asked.set(key, answer);
    answer.catch(() => asked.delete(key));
    if (asked.size > MOST_KEPT) asked.delete(asked.keys().next().value);
  }
  return asked.get(key);
}

/**
 * A line before `body` that says how far a question has come, and can end it; it comes with the first news.
 * @param {import('../app.js').App} app
 */
function progressLine(app, id, body) {
  const { say } = app.words;
  const bar = /** @type {HTMLProgressElement} */ (h('progress', { id: `${id}-progress`, max: 1 }));
  const line = h('div', { class: 'starting', role: 'status' },
    h('label', { for: `${id}-progress` }, say('answer-working')), bar,
    button(say('stop'), () => app.engine.stop(), { class: 'plain', id: `${id}-stop` }));
  return {
    hear(done, total) {
      if (!line.isConnected) body.before(line);
      bar.max = Math.max(total, 1);
      bar.value = done;
    },
    end: () => line.remove(),
  };
}

/**
 * The block asks again whenever its request changes, and redraws when the language does.
 * @param {import('../app.js').App} app
 * @param {object} block
 * @param {string} block.id of the block, and of its piece in the report
 * @param {string} block.title key of its heading
 * @param {(state: import('../store.js').State) => ({task: string, request: object}|null)} block.ask
 *   null while there is nothing to ask
 * @param {(answer: any, state: import('../store.js').State) => Array<Node|null|false>} block.draw
 * @param {(answer: any, state: import('../store.js').State) => Array<Node|null|false>} [block.paper] draws it
 *   for the report, where the page's drawing holds controls
 * @param {string} [block.empty] key of the sentence shown while there is nothing to ask
 * @param {Node} [block.choices] what can be chosen about this answer alone
 */
export function answerBlock(app, { id, title, ask, draw, paper = draw, empty, choices }) {
  const heading = h('h2', { id: `${id}-heading` });
  const body = h('div', { class: 'answer', 'aria-live': 'polite', 'aria-busy': 'false' });
  const box = h('section', { id, 'aria-labelledby': `${id}-heading` }, heading, choices, body);
  let latestKey = null;
  let language = null;
  let latest = null;
  let wasConnected = false;

  function show(nodes) {
    body.replaceChildren(...nodes.filter((node) => node instanceof Node));
    body.setAttribute('aria-busy', 'false');
  }

  function redraw() {
    heading.textContent = app.words.say(title);
    if (!latest) {
      show(empty ? [h('p', { class: 'hint' }, app.words.say(empty))] : []);
      app.report.withdraw(id);
    } else if (latest.refusal) {
      show([refusalNote(app, latest.refusal)]);
      app.report.withdraw(id);
    } else {
      const { answer, state } = latest;
      show(draw(answer, state));
      app.report.show({ id, title, draw: () => paper(answer, state) });
    }
  }

  async function update() {
    if (box.isConnected) wasConnected = true;
    else if (wasConnected) return stop();
    const { state } = app.store;
    const question = state.engine.ready ? ask(state) : null;
    const key = JSON.stringify([question, question && state.cohort?.serial]);
    if (key === latestKey) {
      const translated = language !== state.language;
      // Before redrawing: that tells the report, and the report tells everybody.
      language = state.language;
      if (translated) redraw();
      return;
    }
    latestKey = key;
    language = state.language;
    if (!question) {
      latest = null;
      return redraw();
    }
    heading.textContent = app.words.say(title);
    const waiting = setTimeout(() => {
      body.setAttribute('aria-busy', 'true');
    }, PATIENCE_MS);
    const progress = progressLine(app, id, body);
    const long = setTimeout(() => {
      listening.set(key, (listening.get(key) ?? new Set()).add(progress.hear));
    }, LONG_MS);
    try {
      const answer = await askOnce(app, question, key, id);
      if (key === latestKey) latest = { answer, state };
    } catch (refusal) {
      if (refusal.code === 'superseded') {
        // Another block that shared this question moved on; this one still wants its answer.
        if (key === latestKey) {
          latestKey = null;
          update();
        }
        return;
      }
      if (!refusal.code) throw refusal;
      if (key === latestKey) latest = { refusal };
    } finally {
      clearTimeout(waiting);
      clearTimeout(long);
      progress.end();
      listening.get(key)?.delete(progress.hear);
      if (!listening.get(key)?.size) listening.delete(key);
    }
    if (key === latestKey) redraw();
  }

  const stop = app.store.subscribe(update);
  update();
  return box;
}

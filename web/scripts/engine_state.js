/** How far the engine's start has come, and that the page is sealed. */
import { button } from './parts/choices.js';
import { h } from './parts/element.js';
import { live } from './parts/live.js';

/** @param {import('./app.js').App} app */
export function drawEngineState(app) {
  return live(app, (state) => state.engine, (state) => {
    const { engine } = state;
    if (engine.failure) return [failureNote(app, engine.failure)];
    return [
      engine.ready ? null : progressLine(app, engine),
      engine.sealed ? sealLine(app, engine.sealed) : h('p', { class: 'seal' }, app.words.say('not-yet-sealed')),
      engine.revived ? h('p', { class: 'caution', role: 'alert' }, app.words.say(`engine-revived-${engine.revived}`)) : null,
    ];
  });
}

function progressLine(app, { stage, done, total }) {
  const { say, bytes } = app.words;
  const weighed = stage === 'engine-stage-fetching' && total > 0;
  const label = weighed
    ? say('engine-stage-fetching', { done: bytes(done), total: bytes(total) })
    : say(stage, { done, total });
  return h('div', { class: 'starting' },
    h('label', { for: 'engine-progress' }, label),
    h('progress', { id: 'engine-progress', max: total || null, value: total ? done : null }));
}

function sealLine(app, proof) {
  const { say } = app.words;
  const outcome = proof.sealed ? 'sealed' : 'seal-broken';
  return h('details', { class: `seal ${outcome}` },
    h('summary', {}, say(outcome)),
    h('p', {}, say('sealed-meaning')),
    h('p', {}, say('sealed-tried', { refused: proof.refused, tried: proof.tried })),
    h('p', {}, say('sealed-check-yourself')));
}

function failureNote(app, failure) {
  const { say, has } = app.words;
  const key = has(`engine-failure-${failure}`) ? `engine-failure-${failure}` : 'engine-failure-internal';
  return h('div', { class: 'refusal', role: 'alert' },
    h('p', {}, say(key)),
    button(say('start-again'), () => location.reload()));
}

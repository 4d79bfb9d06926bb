/** A part of the page that redraws itself when what it shows has changed. */
import { h } from './element.js';

/**
 * @param {import('../app.js').App} app
 * @param {(state: import('../store.js').State) => unknown} select what the drawing depends on, as plain data
 * @param {(state: import('../store.js').State) => Array<Node|null|false>} draw
 * @param {Record<string, string>} [attributes]
 */
export function live(app, select, draw, attributes = {}) {
  const box = h('div', attributes);
  let seen = null;
  let wasConnected = false;

  function update() {
    if (box.isConnected) wasConnected = true;
    else if (wasConnected) return stop();
    const { state } = app.store;
    const now = JSON.stringify([state.language, select(state)]);
    if (now === seen) return;
    seen = now;
    const focused = box.contains(document.activeElement) ? document.activeElement?.id : '';
    box.replaceChildren(...draw(state).filter((node) => node instanceof Node));
    // Whoever was typing here goes on typing here.
    if (focused) document.getElementById(focused)?.focus();
  }

  const stop = app.store.subscribe(update);
  update();
  return box;
}

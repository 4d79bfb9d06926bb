/** A part of the page that redraws itself when what it shows has changed. */
import { h } from './element.js';

/** Redraws that wait: a control must not be replaced while it is being left or pressed. @type {Set<() => void>} */
const waiting = new Set();
let pressing = false;

document.addEventListener('pointerdown', () => {
  pressing = true;
}, true);
for (const released of ['pointerup', 'pointercancel']) {
  document.addEventListener(released, () => {
    pressing = false;
    // The click comes after the release; it must still find what was pressed.
    setTimeout(redrawWaiting);
  }, true);
}

function redrawWaiting() {
  if (pressing) return;
  const due = [...waiting];
  waiting.clear();
  for (const redraw of due) redraw();
}

function redrawLater(redraw) {
  waiting.add(redraw);
  setTimeout(redrawWaiting);
}

/**
 * @param {import('../app.js').App} app
 * @param {(state: import('../store.js').State) => unknown} select what the drawing depends on, as plain data
 * @param {(state: import('../store.js').State) => Array<Node|null|false>} draw handlers in it read the state when they are
 *   called, not when they were drawn: a redraw may still be waiting
 * @param {Record<string, string>} [attributes]
 */
export function live(app, select, draw, attributes = {}) {
  const box = h('div', attributes);
  let seen = null;
  let wasConnected = false;
  let drawn = false;

  function update() {
    if (box.isConnected) wasConnected = true;
    else if (wasConnected) return stop();
    const { state } = app.store;
    const now = JSON.stringify([state.language, select(state)]);
    if (now === seen) return;
    seen = now;
    if (drawn) redrawLater(redraw);
    else redraw();
    drawn = true;
  }

  function redraw() {
    // The box around this one may have been redrawn first, without it.
    if (wasConnected && !box.isConnected) return;
    const { state } = app.store;
    const active = box.contains(document.activeElement) ? document.activeElement : null;
    const typed = active instanceof HTMLInputElement && active.type !== 'checkbox' ? active.value : null;
    box.replaceChildren(...draw(state).filter((node) => node instanceof Node));
    if (!active?.id) return;
    // Whoever was typing here goes on typing here, with what was typed so far.
    const again = document.getElementById(active.id);
    if (typed !== null && again instanceof HTMLInputElement) again.value = typed;
    again?.focus();
  }

  const stop = app.store.subscribe(update);
  update();
  return box;
}

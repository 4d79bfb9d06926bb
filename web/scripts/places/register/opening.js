/** Ways to open a register: choose, drop, paste, or the invented demo. */
import { button } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { live } from '../../parts/live.js';
import { refusalNote } from '../../parts/said.js';

const ENDINGS = '.csv,.tsv,.txt,.xlsx,.ods';

/** @param {import('../../app.js').App} app @param {ReturnType<typeof import('./reader.js').makeReader>} reader */
export function openingBlock(app, reader) {
  return live(app, (state) => [state.engine.ready, state.engine.sealed, state.opening, Boolean(state.source)], (state) => {
    const { say } = app.words;
    const may = state.engine.ready && state.engine.sealed?.sealed && !state.opening?.busy;
    return [
      state.opening?.busy ? progress(app, reader, state.opening) : null,
      state.opening?.refusal ? refusalNote(app, state.opening.refusal) : null,
      dropZone(app, reader, may),
      pasteBox(app, reader, may),
      h('p', {},
        button(say('open-demo'), () => ifWanted(app, () => reader.openDemo()), { id: 'open-demo', class: 'plain', disabled: !may }), ' ',
        h('span', { class: 'hint' }, say('demo-meaning'))),
      may || state.opening?.busy ? null : h('p', { class: 'hint' }, say('open-not-yet')),
    ];
  }, { class: 'opening' });
}

function dropZone(app, reader, may) {
  const { say } = app.words;
  const take = async (file) => {
    if (file) ifWanted(app, async () => reader.open(file.name, new Uint8Array(await file.arrayBuffer())));
  };
  const zone = h('div', { class: 'drop-zone' },
    h('label', { for: 'register-file' }, say('open-file')),
    h('input', {
      id: 'register-file', type: 'file', accept: ENDINGS, disabled: !may,
      onchange: (event) => {
        take(event.target.files[0]);
        event.target.value = '';
      },
    }),
    h('p', { class: 'hint' }, say('open-file-hint')));
  zone.addEventListener('dragover', (event) => {
    event.preventDefault();
    zone.classList.toggle('over', Boolean(may));
  });
  zone.addEventListener('dragleave', () => zone.classList.remove('over'));
  zone.addEventListener('drop', (event) => {
    event.preventDefault();
    zone.classList.remove('over');
    if (may) take(event.dataTransfer.files[0]);
  });
  return zone;
}

/** Cells pasted from a spreadsheet come with tabs between them: a file like any other. */
function pasteBox(app, reader, may) {
  const { say } = app.words;
  const area = /** @type {HTMLTextAreaElement} */ (h('textarea', { id: 'register-paste', rows: 5, disabled: !may, spellcheck: 'false' }));
  return h('details', {},
    h('summary', {}, say('paste-summary')),
    h('label', { for: 'register-paste' }, say('paste-label')),
    area,
    button(say('paste-open'), () => {
      if (area.value.trim()) ifWanted(app, () => reader.open(say('pasted-name'), new TextEncoder().encode(area.value)));
    }, { id: 'register-paste-open', disabled: !may }));
}

function progress(app, reader, { done, total }) {
  const { say, percent } = app.words;
  return h('div', { class: 'starting', role: 'status' },
    h('label', { for: 'opening-progress' }, total ? say('opening-share', { share: percent(done / total, 0) }) : say('opening-file')),
    h('progress', { id: 'opening-progress', max: total || null, value: total ? done : null }),
    button(say('stop'), () => reader.stop(), { id: 'opening-stop', class: 'plain' }));
}

/** A register that is open is only given up when its owner says so. */
function ifWanted(app, then) {
  if (!app.store.state.source) return then();
  const { say } = app.words;
  const dialog = /** @type {HTMLDialogElement} */ (h('dialog', { 'aria-labelledby': 'replace-question' },
    h('form', { method: 'dialog' },
      h('p', { id: 'replace-question' }, say('replace-question')),
      h('p', { class: 'actions' },
        h('button', { value: 'yes', id: 'replace-yes' }, say('replace-yes')), ' ',
        h('button', { value: 'no', class: 'plain' }, say('replace-no'))))));
  dialog.addEventListener('close', () => {
    dialog.remove();
    if (dialog.returnValue === 'yes') then();
  });
  document.body.append(dialog);
  dialog.showModal();
}

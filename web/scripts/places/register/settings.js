/** How the register is read, kept as a small file without patients, and applied to the next list. */
import { button } from '../../parts/choices.js';
import { h, written } from '../../parts/element.js';
import { live } from '../../parts/live.js';
import { cautionList, refusalNote } from '../../parts/said.js';
import { save } from '../../parts/save.js';
import { requestOf, whatIsMissing } from './reader.js';

/** @param {import('../../app.js').App} app */
export function settingsBlock(app) {
  return live(app, (state) => [state.appliedSettings, state.source && whatIsMissing(state).length, state.savedSettings], (state) => {
    const { say } = app.words;
    const complete = !whatIsMissing(state).length;
    return [h('section', { 'aria-labelledby': 'settings-heading' },
      h('h2', { id: 'settings-heading' }, say('settings-title')),
      h('p', {}, say('settings-lead')),
      h('p', {},
        h('label', { for: 'settings-file' }, say('settings-apply')), ' ',
        h('input', {
          id: 'settings-file', type: 'file', accept: '.json,application/json',
          onchange: (event) => {
            const [file] = event.target.files;
            event.target.value = '';
            if (file) apply(app, file);
          },
        })),
      h('p', {}, button(say('settings-save'), () => keep(app), { id: 'settings-save', class: 'plain', disabled: !complete }), ' ',
        complete ? null : h('span', { class: 'hint' }, say('settings-save-later'))),
      h('div', { 'aria-live': 'polite' },
        state.savedSettings?.left ? h('p', { class: 'note' }, say('settings-left-out', { n: state.savedSettings.left })) : null,
        ...told(app, state.appliedSettings)))];
  });
}

async function keep(app) {
  try {
    const { settings, values_left_out: left } = await app.engine.ask('register.settings', requestOf(app.store.state.reading));
    save('register-settings.json', 'application/json', `${JSON.stringify(settings, null, 2)}\n`);
    app.store.settle({ savedSettings: { left } });
  } catch (refusal) {
    if (!refusal.code) throw refusal;
    app.store.settle({ appliedSettings: { refusal: plain(refusal) } });
  }
}

async function apply(app, file) {
  try {
    const answer = await app.engine.ask('register.apply_settings', { text: await file.text() });
    const { reading } = app.store.state;
    // A closing date that was typed for this list goes before the one of the last.
    const typed = reading.closing_date ? { closing_date: reading.closing_date } : {};
    const cautions = answer.cautions.filter(({ code }) => !reading.closing_date || !OF_CLOSING.includes(code));
    // Endings and sexes that the kept choices do not know keep what was proposed for them.
    const meanings = { ...reading.meanings, ...answer.reading.meanings };
    const sexes = { ...reading.sexes, ...answer.reading.sexes };
    app.store.change({ reading: { ...reading, ...answer.reading, ...typed, meanings, sexes }, appliedSettings: { ...answer, cautions } });
  } catch (refusal) {
    if (!refusal.code) throw refusal;
    app.store.settle({ appliedSettings: { refusal: plain(refusal) } });
  }
}

const OF_CLOSING = ['closing_date_from_settings', 'dates_after_closing'];

/** What the settings made of this list: where the two agree, and every difference. */
function told(app, applied) {
  if (!applied) return [];
  if (applied.refusal) return [refusalNote(app, applied.refusal)];
  const { say } = app.words;
  const list = (key, entries, show) => (entries.length ? [h('p', {}, say(key)), h('ul', {}, entries.map((entry) => h('li', {}, show(entry))))] : []);
  return [
    h('p', { class: 'sentence', id: 'settings-applied' }, say('settings-applied', { matched: applied.matched })),
    ...list('settings-absent', applied.absent, ({ heading, role }) => [written(heading), ' – ', say(`role-${role}`)]),
    ...list('settings-added', applied.added, (heading) => written(heading)),
    ...list('settings-new-values', applied.new_values, ({ value, count }) => [written(value), ' – ', say('settings-rows', { n: count })]),
    applied.absent.length || applied.added.length || applied.new_values.length ? null : h('p', {}, say('settings-no-difference')),
    cautionList(app, applied.cautions),
  ];
}

function plain({ code, parameters, field, line }) {
  return { code, parameters, field, line };
}

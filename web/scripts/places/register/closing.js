/** The closing date: the day the register was frozen. Asked for, never taken from the clock. */
import { textField } from '../../parts/choices.js';
import { h } from '../../parts/element.js';
import { live } from '../../parts/live.js';

/** @param {import('../../app.js').App} app */
export function closingBlock(app) {
  return live(app, (state) => state.reading.closing_date, (state) => {
    const { say } = app.words;
    return [h('section', { 'aria-labelledby': 'closing-heading' },
      h('h2', { id: 'closing-heading' }, say('closing-title')),
      textField({
        id: 'closing-date', type: 'date', label: say('closing-label'), hint: say('closing-hint'), value: state.reading.closing_date,
        onchange: (closing_date) => app.store.amend('reading', { closing_date }),
      }))];
  });
}

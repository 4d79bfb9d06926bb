/** An actuarial life table as a ruled table; registers and typed counts show the same one. */
import { DAYS_PER_MONTH, DAYS_PER_YEAR } from '../units.js';
import { table } from './table.js';

/**
 * @param {import('../app.js').App} app
 * @param {{ name: string, caption: string, rows: any[], step: 'year'|'quarter'|'month' }} lifeTable rows of the engine's answer
 */
export function lifeTable(app, { name, caption, rows, step }) {
  const { say, count, decimal, percent, estimate } = app.words;
  const unit = step === 'year' ? DAYS_PER_YEAR : DAYS_PER_MONTH;
  const boundary = (days) => decimal(days / unit, Number.isInteger(Math.round((days / unit) * 1e6) / 1e6) ? 0 : 1);
  const number = (heading, field, write) => ({ heading: say(heading), show: (row) => write(row[field]), full: (row) => row[field] });
  return table(app, {
    name, caption, rows,
    columns: [
      {
        heading: say(step === 'year' ? 'interval-years' : 'interval-months'), text: true,
        show: (row) => say('interval-from-to', { from: boundary(row.from_days), to: boundary(row.to_days) }),
      },
      number('entering', 'entering', count),
      number('lost', 'lost', count),
      number('withdrawn', 'withdrawn', count),
      number('events', 'events', count),
      number('effective', 'effective', (n) => decimal(n, 1)),
      number('chance', 'chance', (q) => percent(q)),
      number('odds', 'odds', (odds) => decimal(odds, 3)),
      { heading: say('survival-to-end'), show: (row) => estimate(row.survival, (s) => percent(s)), full: (row) => row.survival.value },
      { heading: say('hazard-per-year'), show: (row) => decimal(row.hazard.value, 3), full: (row) => row.hazard.value },
    ],
  });
}

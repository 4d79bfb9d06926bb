/** Where the numbers come from: the file, who was set aside, who was followed and for how long. */
import { h, written } from '../../parts/element.js';
import { cautionList } from '../../parts/said.js';
import { table } from '../../parts/table.js';

/** @param {import('../../app.js').App} app */
export function aboutData(app) {
  const { say, count, decimal, day } = app.words;
  const { source, cohort } = app.store.state;
  return h('section', {},
    h('h2', {}, say('about-data')),
    h('p', {}, say('about-data-sentence', {
      n: cohort.n, years: decimal(cohort.person_years, 0), first: day(cohort.first_start), last: day(cohort.last_start), closing: day(cohort.closing_date),
    })),
    flowTable(app, cohort),
    cautionList(app, cohort.cautions),
    h('dl', { class: 'facts' },
      h('dt', {}, say('about-file')), h('dd', {}, written(source.name)),
      h('dt', {}, say('about-fingerprint')), h('dd', { class: 'fingerprint' }, source.fingerprint),
      h('dt', {}, say('about-rows')), h('dd', {}, count(cohort.rows))));
}

/** From the rows of the file to how each patient's follow-up ended. */
function flowTable(app, cohort) {
  const { say, count, percent } = app.words;
  const aside = Object.entries(cohort.set_aside_counts).map(([code, n]) => ({ label: say(`set-aside-${code}-short`), n, inside: true }));
  const changed = Object.entries(cohort.changed_counts).map(([code, n]) => ({ label: say(`changed-${code}-short`), n, inside: true }));
  const endings = Object.entries(cohort.outcomes).filter(([, n]) => n > 0)
    .map(([meaning, n]) => ({ label: say(`meaning-${meaning}`), n, share: n / cohort.n, inside: true }));
  /** @type {Array<{label: string, n: number, share?: number, inside?: boolean}>} */
  const rows = [
    { label: say('flow-rows'), n: cohort.rows },
    ...(aside.length ? [{ label: say('flow-set-aside'), n: aside.reduce((sum, { n }) => sum + n, 0) }, ...aside] : []),
    { label: say('flow-analysed'), n: cohort.n, share: 1 },
    ...endings,
    ...(changed.length ? [{ label: say('flow-changed'), n: changed.reduce((sum, { n }) => sum + n, 0) }, ...changed] : []),
  ];
  return table(app, {
    name: 'patients', caption: say('flow-caption'), rows,
    rowClass: (row) => (row.inside ? 'inside' : null),
    columns: [
      { heading: say('flow-stage'), show: (row) => row.label, text: true },
      { heading: say('patients'), show: (row) => count(row.n), full: (row) => row.n },
      { heading: say('share'), show: (row) => percent(row.share ?? null), full: (row) => row.share ?? null },
    ],
  });
}

/** The report as a document: its head, where the numbers come from, the pieces, what must always be printed. */
import { h } from '../../parts/element.js';
import { aboutData } from './about_data.js';

/** @param {import('../../app.js').App} app */
export function reportDocument(app) {
  const { say } = app.words;
  const { report, cohort, engine } = app.store.state;
  const pieces = app.report.pieces().filter(({ id }) => !report.leftOut.includes(id));
  const paper = h('article', { class: 'report' },
    h('header', {},
      h('h1', {}, report.title || say('report-untitled')),
      h('p', { class: 'byline' }, [report.hospital, report.author, report.date].filter(Boolean).join(' · ') || say('report-no-byline'))),
    h('p', { class: 'always' }, say('always-cautions')),
    cohort ? aboutData(app) : null,
    pieces.map((piece) => h('section', { 'data-piece': piece.id }, h('h2', {}, say(piece.title)), piece.draw())),
    h('footer', {}, h('p', {}, say('report-made-with', { version: engine.version ?? '' }))));
  number(paper, 'figcaption', (n, text) => say('figure-number', { number: n, title: text }));
  number(paper, 'caption', (n, text) => say('table-number', { number: n, title: text }));
  return paper;
}

/** Figures and tables are numbered in the order of the report. */
function number(paper, selector, write) {
  [...paper.querySelectorAll(selector)].forEach((element, position) => {
    element.textContent = write(position + 1, element.textContent);
  });
}

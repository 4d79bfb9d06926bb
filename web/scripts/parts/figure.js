/** A figure: its title, the drawing at the width there is, and the table behind it. */
import { button } from './choices.js';
import { h } from './element.js';
import { save } from './save.js';

const WIDEST = 760;
const NARROWEST = 280;

/**
 * @param {import('../app.js').App} app
 * @param {object} figure
 * @param {string} figure.name file name without its ending
 * @param {string} figure.title
 * @param {string} figure.described what is to be seen, for someone who cannot see it
 * @param {(width: number) => Element} figure.draw SVG (or a figure holding one), made anew for each width
 * @param {Node} [figure.below] what belongs right under the drawing (the at-risk table)
 * @param {Node} [figure.data] the table behind the figure
 */
export function figure(app, { name, title, described, draw, below, data }) {
  const { say } = app.words;
  const plate = h('div', { class: 'plate', role: 'img', 'aria-label': described });
  let drawnAt = 0;

  function redraw(room) {
    const width = Math.round(Math.max(NARROWEST, Math.min(WIDEST, room)));
    if (width === drawnAt) return;
    drawnAt = width;
    const drawing = draw(width);
    // The plate speaks for the drawing as a whole; names within it would only be noise.
    for (const part of drawing.querySelectorAll('[aria-label], [aria-description]')) {
      part.removeAttribute('aria-label');
      part.removeAttribute('aria-description');
    }
    plate.replaceChildren(drawing);
  }

  redraw(WIDEST);
  new ResizeObserver(([entry]) => {
    // A hidden place has no width; its figures keep the last one.
    if (entry.contentRect.width > 0) redraw(entry.contentRect.width);
  }).observe(plate);

  return h('figure', {},
    h('figcaption', {}, title),
    plate,
    below,
    data && h('details', { class: 'behind' }, h('summary', {}, say('figure-data')), data),
    button(say('save-figure'), () => save(`${name}.svg`, 'image/svg+xml', figureAsSvg(plate)), {
      class: 'quiet', 'data-screen-only': true,
    }));
}

/** The drawing as a file of its own. Several drawings in one plate are saved as the first. */
function figureAsSvg(plate) {
  const svg = /** @type {SVGSVGElement} */ (plate.querySelector('svg').cloneNode(true));
  svg.setAttribute('xmlns', 'http://www.w3.org/2000/svg');
  return `<?xml version="1.0" encoding="UTF-8"?>\n${new XMLSerializer().serializeToString(svg)}`;
}

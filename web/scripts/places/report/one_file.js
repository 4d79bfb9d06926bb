/** The report as one HTML file that opens anywhere, asks nothing of any network and runs nothing. */

/**
 * @param {import('../../app.js').App} app
 * @param {Element} paper
 * @returns {string}
 */
export function asOneFile(app, paper) {
  const kept = document.implementation.createHTMLDocument(paper.querySelector('h1').textContent);
  kept.documentElement.lang = app.words.language;
  kept.documentElement.dir = app.words.direction;
  const metas = [
    { charset: 'utf-8' },
    { 'http-equiv': 'Content-Security-Policy', content: "default-src 'none'; style-src 'unsafe-inline'; img-src data:" },
    { name: 'viewport', content: 'width=device-width, initial-scale=1' },
  ];
  for (const attributes of metas.reverse()) {
    const meta = kept.createElement('meta');
    for (const [name, value] of Object.entries(attributes)) meta.setAttribute(name, value);
    kept.head.prepend(meta);
  }
  const style = kept.createElement('style');
  style.textContent = pageStyles();
  kept.head.append(style);
  const body = kept.importNode(paper, true);
  for (const element of body.querySelectorAll('[data-screen-only]')) element.remove();
  kept.body.append(body);
  return `<!doctype html>\n${kept.documentElement.outerHTML}\n`;
}

function pageStyles() {
  return [...document.styleSheets].flatMap((sheet) => [...sheet.cssRules].map((rule) => rule.cssText)).join('\n');
}

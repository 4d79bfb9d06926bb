/** Elements made by hand. Text only ever becomes a text node, so a register can never bring markup. */

/**
 * @param {string} tag
 * @param {Record<string, any>} [properties] attributes; names beginning with "on" are listeners;
 *   false, null and undefined leave an attribute out, true writes it empty
 * @param {...(Node|string|number|null|undefined|false|Array<any>)} children
 * @returns {HTMLElement}
 */
export function h(tag, properties = {}, ...children) {
  const element = document.createElement(tag);
  for (const [name, value] of Object.entries(properties)) {
    if (value === null || value === undefined || value === false) continue;
    if (name.startsWith('on')) element.addEventListener(name.slice(2), value);
    else if (name === 'value' || name === 'checked' || name === 'selected') element[name] = value;
    else element.setAttribute(name, value === true ? '' : String(value));
  }
  append(element, children);
  return element;
}

function append(element, children) {
  for (const child of children) {
    if (child === null || child === undefined || child === false) continue;
    if (Array.isArray(child)) append(element, child);
    else element.append(child instanceof Node ? child : document.createTextNode(String(child)));
  }
}

/** Something written in the register, whatever its script and direction. */
export function written(text) {
  return h('bdi', {}, text);
}

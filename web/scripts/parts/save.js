/** Saving on this computer; nothing is sent anywhere. */
import { h } from './element.js';

/**
 * @param {string} name of the file
 * @param {string} type its media type
 * @param {BlobPart} content
 */
export function save(name, type, content) {
  const address = URL.createObjectURL(new Blob([content], { type }));
  const link = h('a', { href: address, download: name });
  document.body.append(link);
  link.click();
  link.remove();
  // The browser needs the address until it has begun to write the file.
  setTimeout(() => URL.revokeObjectURL(address), 60_000);
}

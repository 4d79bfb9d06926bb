/** What has been shown so far, in the order it was first shown. */

/**
 * @typedef {object} Piece
 * @property {string} id of the block that showed it
 * @property {string} title key of its heading
 * @property {() => Array<Node|null|false>} draw its nodes, made anew
 */

export function makeReport() {
  /** @type {Map<string, Piece>} */
  const pieces = new Map();
  const listeners = new Set();
  const tell = () => {
    for (const listener of listeners) listener();
  };

  return {
    /** A piece keeps its first position when it is shown again. @param {Piece} piece */
    show(piece) {
      pieces.set(piece.id, piece);
      tell();
    },

    /** The block no longer shows an answer. @param {string} id */
    withdraw(id) {
      if (pieces.delete(id)) tell();
    },

    pieces: () => [...pieces.values()],

    /** @param {() => void} listener */
    subscribe(listener) {
      listeners.add(listener);
    },
  };
}

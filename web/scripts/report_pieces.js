/** What has been shown so far, in the order it was first shown. */

/**
 * @typedef {object} Piece
 * @property {string} id of the block that showed it
 * @property {string} title key of its heading
 * @property {() => Array<Node|null|false>} draw its nodes, made anew
 */

/** @param {(serial: number) => void} tell called with a new serial whenever the pieces change */
export function makeReport(tell) {
  /** @type {Map<string, Piece>} */
  const pieces = new Map();
  let serial = 0;
  const changed = () => {
    serial += 1;
    tell(serial);
  };

  return {
    /** A piece keeps its first position when it is shown again. @param {Piece} piece */
    show(piece) {
      pieces.set(piece.id, piece);
      changed();
    },

    /** The block no longer shows an answer. @param {string} id */
    withdraw(id) {
      if (pieces.delete(id)) changed();
    },

    pieces: () => [...pieces.values()],
  };
}

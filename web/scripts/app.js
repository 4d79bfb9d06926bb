/** What every part of the page is handed: the choices, the words, the engine and the report. */
import { makeReport } from './report_pieces.js';
import { beginnings, makeStore } from './store.js';
import { wordsIn } from './words.js';

/**
 * @typedef {object} Engine
 * @property {(task: string, request: object, options?: {key?: string, onProgress?: Function}) => Promise<any>} ask
 * @property {() => void} stop
 */

/** @typedef {ReturnType<typeof makeApp>} App */

/** @param {string} language */
export function makeApp(language) {
  const store = makeStore(beginnings(language));
  const app = {
    store,
    words: wordsIn(language),
    /** Set once the engine has started; nothing is asked before. @type {Engine} */
    engine: /** @type {any} */ (null),
    report: makeReport((reportSerial) => store.change({ reportSerial })),
    /** The unpacked demo register. @type {Uint8Array|null} */
    demo: null,

    /** @param {string} tag a key of LANGUAGES */
    speak(tag) {
      app.words = wordsIn(tag);
      document.documentElement.lang = tag;
      document.documentElement.dir = app.words.direction;
      store.change({ language: tag });
    },
  };
  return app;
}

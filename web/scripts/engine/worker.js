/**
 * The engine's worker: Pyodide from what it is handed, then tasks one after another.
 *
 * In:  { start: { module, stdlib, lock, engine } } once, then { id, task, request, content }.
 * Out: { stage, done, total } while starting, then { ready };
 *      { id, stage, done, total }, and at last { id, answer, nulls } or { id, refusal } or
 *      { id, failed: { kind, detail } } for what should never happen; kinds are "out_of_memory" and
 *      "internal", the detail is for developers. Any message may carry { dead: kind }: Python can no
 *      longer be used, and the worker waits for its end.
 *
 * This is a classic script, put behind Pyodide's own at build time (build_scripts/worker_source.py).
 */
(() => {
  'use strict';

  /** An address that can never be a host: Pyodide asks for its files under it. */
  const PACK = 'https://pack.invalid/';

  /** Python's way in: JSON text in and out. Nothing else crosses but the bytes of a file and progress. */
  const DOOR = `
import json
from vitalroll.desk import Desk

def door():
    desk = Desk()

    def answer(task, request, content, tell):
        given = json.loads(request)
        if content is not None:
            given["content"] = content.to_bytes()

        def report(stage, done, total):
            tell(str(stage), int(done), int(total))

        return json.dumps(desk.answer(task, given, report), allow_nan=False)

    return answer

door()
`;

  /** What is done after the runtime has started, in order: [stage, work]. */
  const STEPS = [
    ['engine-stage-unpacking', (python, { engine }) => unpack(python, engine)],
    ['engine-stage-libraries', (python) => python.runPython('import numpy')],
    ['engine-stage-libraries', (python) => python.runPython('import scipy.special')],
    ['engine-stage-desk', (python) => python.runPython(DOOR)],
  ];

  async function start(handed) {
    const total = STEPS.length + 1;
    self.postMessage({ stage: 'engine-stage-runtime', done: 0, total });
    const python = await runtime(handed);
    let result;
    for (const [i, [stage, work]] of STEPS.entries()) {
      self.postMessage({ stage, done: i + 1, total });
      result = work(python, handed);
    }
    return result;
  }

  /** Start Pyodide. The seal forbids every request; what Pyodide would fetch is put in its hands instead. */
  function runtime({ module, stdlib, lock }) {
    self.fetch = async (address) => {
      const name = String(address.url ?? address).slice(PACK.length);
      if (name === 'python_stdlib.zip') return new Response(stdlib);
      // Its content is the compiled module, below.
      if (name === 'pyodide.asm.wasm') return new Response();
      throw new TypeError(`not in the pack: ${name}`);
    };
    WebAssembly.instantiateStreaming = async (response, imports) => {
      await response;
      return { module, instance: await WebAssembly.instantiate(module, imports) };
    };
    return self.loadPyodide({
      indexURL: PACK,
      lockFileContents: new TextDecoder().decode(lock),
      createPyodideModule: self.createPyodideModule,
      stdin: () => null,
    });
  }

  /** The archive holds site-packages as stored files; no package loader is needed for them. */
  function unpack(python, archive) {
    python.unpackArchive(archive, 'zip', { extractDir: python.runPython('import site; site.getsitepackages()[0]') });
  }

  function work({ id, task, request, content }) {
    const tell = (stage, done, total) => self.postMessage({ id, stage, done, total });
    const bytes = content === undefined ? undefined : new Uint8Array(content);
    try {
      const { answer: found, nulls, refusal } = JSON.parse(answer(task, JSON.stringify(request), bytes, tell));
      self.postMessage(refusal ? { id, refusal } : { id, answer: found, nulls });
    } catch (fault) {
      const kind = kindOf(fault);
      // An exception in Python leaves Python whole, but memory that it took is never given back.
      const usable = fault.name === 'PythonError' && kind !== 'out_of_memory';
      self.postMessage({ id, failed: { kind, detail: String(fault.message) }, dead: usable ? null : kind });
    }
  }

  /** Memory runs out in Python (MemoryError), in JavaScript (RangeError) or in WebAssembly (RuntimeError). */
  function kindOf(fault) {
    console.error(fault);
    const memory = fault.type === 'MemoryError' || /out of memory|allocation failed|array buffer|array length/i.test(fault.message);
    return memory ? 'out_of_memory' : 'internal';
  }

  /** @type {Function} */
  let answer;

  self.onmessage = async ({ data }) => {
    if (!data.start) return work(data);
    try {
      answer = await start(data.start);
      self.postMessage({ ready: true });
    } catch (fault) {
      self.postMessage({ dead: kindOf(fault) });
    }
  };
})();

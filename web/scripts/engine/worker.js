/**
 * The engine's worker: Pyodide from the bytes it is handed, then tasks one after another.
 *
 * In:  { start: { members } } once, then { id, task, request, content }.
 * Out: { stage, done, total } while starting, then { ready };
 *      { id, stage, done, total }, and at last { id, answer } or { id, refusal } or { id, failed };
 *      { dead: reason } when Python can no longer be used.
 *
 * This is a classic script, put behind Pyodide's own at build time (build_scripts/worker_source.py).
 */
(() => {
  'use strict';

  /** An address that can never be a host: files of the pack are asked for under it. */
  const PACK = 'https://pack.invalid/';
  const STEPS = 4;

  /** Answers only from the pack. The seal forbids everything else anyway; this says so plainly. */
  function fetchFromPack(files) {
    return async (address) => {
      const name = String(address.url ?? address).slice(PACK.length);
      if (!files.has(name)) throw new TypeError(`not in the pack: ${name}`);
      const type = name.endsWith('.wasm') ? 'application/wasm' : 'application/octet-stream';
      return new Response(files.get(name), { headers: { 'Content-Type': type } });
    };
  }

  async function start({ members }) {
    const stage = (name, done) => self.postMessage({ stage: name, done, total: STEPS });
    stage('engine-stage-runtime', 0);
    self.fetch = fetchFromPack(new Map([
      ['pyodide.asm.wasm', members.get('wasm')],
      ['python_stdlib.zip', members.get('stdlib')],
    ]));
    const python = await self.loadPyodide({
      indexURL: PACK,
      lockFileContents: new TextDecoder().decode(members.get('lock')),
      createPyodideModule: self.createPyodideModule,
      stdin: () => null,
    });
    stage('engine-stage-unpacking', 1);
    unpack(python, members.get('engine'));
    stage('engine-stage-libraries', 2);
    python.runPython('import numpy, scipy.special');
    stage('engine-stage-desk', 3);
    const answer = python.runPython(DOOR);
    stage('engine-stage-desk', STEPS);
    return answer;
  }

  /** JSON text in, JSON text out: nothing else crosses into Python but the bytes of a file. */
  const DOOR = `
import json
from vitalroll.desk import Desk

def door():
    desk = Desk()

    def answer(task, request, content, report):
        given = json.loads(request)
        if content is not None:
            given["content"] = content.to_bytes()
        return json.dumps(desk.answer(task, given, report), allow_nan=False)

    return answer

door()
`;

  /** The archive holds files stored as they are; Python's own zip reader unpacks it. */
  function unpack(python, archive) {
    python.unpackArchive(archive, 'zip', { extractDir: python.runPython('import site; site.getsitepackages()[0]') });
  }

  function work(answer, { id, task, request, content }) {
    const report = (stage, done, total) => self.postMessage({ id, stage, done, total });
    try {
      const said = JSON.parse(answer(task, JSON.stringify(request), content ? new Uint8Array(content) : undefined, report));
      self.postMessage(said.refusal ? { id, refusal: said.refusal } : { id, answer: said.answer, nulls: said.nulls });
    } catch (fault) {
      const kind = reasonOf(fault);
      self.postMessage({ id, failed: kind });
      if (fault.name !== 'PythonError' || kind === 'out_of_memory') self.postMessage({ dead: kind });
    }
  }

  function reasonOf(fault) {
    console.error(fault);
    const memory = fault instanceof RangeError || fault.type === 'MemoryError' || /out of memory/i.test(fault.message);
    return memory ? 'out_of_memory' : 'internal';
  }

  let answer = null;

  self.onmessage = async ({ data }) => {
    if (!data.start) return work(answer, data);
    try {
      answer = await start(data.start);
      self.postMessage({ ready: true });
    } catch (fault) {
      self.postMessage({ dead: reasonOf(fault) });
    }
  };
})();

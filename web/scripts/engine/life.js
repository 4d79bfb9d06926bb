/** One life of the worker: from its start to its death, one question at a time. */
import { EngineRefusal } from './refusal.js';

/** The worker is no more. `reason` is "out_of_memory", "internal" or "stopped". */
export class WorkerDeath extends Error {
  /** @param {string} reason */
  constructor(reason) {
    super(reason);
    this.reason = reason;
  }
}

/**
 * Prepare what every life begins with, once: the script's address and the compiled runtime.
 * @param {Map<string, Uint8Array>} members unpacked members of the pack; kept, since nothing can be fetched again
 */
export async function prepareLives(members) {
  const source = new Blob([/** @type {BlobPart} */ (members.get('worker'))], { type: 'text/javascript' });
  const address = URL.createObjectURL(source);
  const module = await WebAssembly.compile(/** @type {BufferSource} */ (members.get('wasm')));
  const handed = {
    module,
    stdlib: members.get('stdlib'),
    lock: members.get('lock'),
    engine: members.get('engine'),
  };

  /**
   * Start a worker; rejects with WorkerDeath when it does not come to life.
   * @param {(stage: string, done: number, total: number) => void} onStage
   */
  return async function begin(onStage) {
    const worker = new Worker(address);
    /** @type {{ id: number, onProgress?: Function, resolve: Function, reject: Function }|null} */
    let question = null;
    let ids = 0;
    /** @type {(death: WorkerDeath) => void} */
    let toll;
    const died = /** @type {Promise<WorkerDeath>} */ (new Promise((settle) => {
      toll = settle;
    }));

    /** @param {string} reason */
    function end(reason) {
      if (life.ended) return;
      life.ended = reason;
      worker.terminate();
      const death = new WorkerDeath(reason);
      toll(death);
      question?.reject(death);
      question = null;
    }

    function heard({ stage, done, total, answer, refusal, failed }) {
      if (stage !== undefined) return question.onProgress?.(stage, done, total);
      const { resolve, reject } = question;
      question = null;
      if (answer !== undefined) resolve(answer);
      else if (refusal) reject(new EngineRefusal(refusal));
      else reject(new EngineRefusal({ code: failed.kind, parameters: { detail: failed.detail } }));
    }

    const life = {
      /** Why the worker ended, or null while it lives. @type {string|null} */
      ended: null,
      died,
      end,
      /**
       * @param {string} task
       * @param {any} request
       * @param {(stage: string, done: number, total: number) => void} [onProgress]
       * @returns {Promise<any>} rejects with EngineRefusal or WorkerDeath
       */
      ask(task, { content, ...request }, onProgress) {
        return new Promise((resolve, reject) => {
          if (life.ended) return reject(new WorkerDeath(life.ended));
          ids += 1;
          question = { id: ids, onProgress, resolve, reject };
          worker.postMessage({ id: ids, task, request, content });
        });
      },
    };

    await new Promise((ready, failed) => {
      worker.onmessage = ({ data }) => {
        if (data.ready) ready(undefined);
        else if (data.id !== undefined && data.id === question?.id) heard(data);
        else if (data.stage) onStage(data.stage, data.done, data.total);
        if (data.dead) end(data.dead);
      };
      worker.onmessageerror = () => end('internal');
      worker.onerror = (event) => {
        event.preventDefault();
        end('internal');
      };
      died.then(failed);
      worker.postMessage({ start: handed });
    });
    return life;
  };
}

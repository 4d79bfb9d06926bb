/**
 * The only module that knows the worker. Questions go in one after another; each gets its answer
 * or a refusal; a worker that dies is started again and given its register again.
 */

/** Why a question has no answer. */
export class EngineRefusal extends Error {
  /** @param {{code: string, parameters?: Record<string, any>, field?: string|null, line?: number|null}} refusal */
  constructor({ code, parameters = {}, field = null, line = null }) {
    super(code);
    this.code = code;
    this.parameters = parameters;
    this.field = field;
    this.line = line;
  }
}

/** Tasks that put something into the engine's memory; the last of each is repeated after a restart. */
const REMEMBERED = ['register.open', 'register.build'];
const FORGETS = 'register.forget';

/**
 * @typedef {object} Question
 * @property {number} id
 * @property {string} task
 * @property {any} request
 * @property {string} [key] a later question with the same key takes this one's place
 * @property {(stage: string, done: number, total: number) => void} [onProgress]
 * @property {(answer: any) => void} resolve
 * @property {(refusal: EngineRefusal) => void} reject
 * @property {boolean} [again] it was being worked on when a worker died
 */

/**
 * Start the engine from the unpacked members of the pack. The page must be sealed before.
 * @param {{ members: Map<string, Uint8Array>, onStage: (stage: string, done: number, total: number) => void, onDeath: (reason: string) => void }} options
 */
export async function startEngine({ members, onStage, onDeath }) {
  const source = URL.createObjectURL(new Blob([/** @type {BlobPart} */ (members.get('worker'))], { type: 'text/javascript' }));
  const handed = new Map(['wasm', 'stdlib', 'lock', 'engine'].map((name) => [name, members.get(name)]));
  /** @type {Question[]} */
  let waiting = [];
  /** @type {Question|null} */
  let current = null;
  /** @type {Map<string, any>} */
  const remembered = new Map();
  /** @type {Worker} */
  let worker;
  let ids = 0;

  function launch() {
    return new Promise((ready, failed) => {
      worker = new Worker(source);
      worker.onmessage = ({ data }) => {
        if (data.ready) ready(undefined);
        else if (data.dead) died(data.dead, failed);
        else if (data.id === undefined) onStage(data.stage, data.done, data.total);
        else if (data.id === current?.id) heard(data);
      };
      worker.onerror = (event) => {
        event.preventDefault();
        died('internal', failed);
      };
      worker.postMessage({ start: { members: handed } });
    });
  }

  function heard(message) {
    const question = current;
    if ('stage' in message) return question.onProgress?.(message.stage, message.done, message.total);
    current = null;
    if ('answer' in message) {
      if (REMEMBERED.includes(question.task)) remember(question);
      if (question.task === FORGETS) remembered.clear();
      question.resolve(message.answer);
    } else {
      question.reject(new EngineRefusal(message.refusal ?? { code: message.failed }));
    }
    next();
  }

  function remember({ task, request }) {
    // A new register makes what was built from the one before it meaningless.
    if (task === REMEMBERED[0]) remembered.clear();
    remembered.set(task, request);
  }

  function next() {
    if (current || !worker) return;
    current = waiting.shift() ?? null;
    if (!current) return;
    const { content, ...request } = current.request;
    worker.postMessage({ id: current.id, task: current.task, request, content });
  }

  /** @param {(failure: EngineRefusal) => void} failed called when the worker died while starting */
  async function died(reason, failed) {
    worker.terminate();
    worker = null;
    const interrupted = current;
    current = null;
    if (interrupted && reason !== 'stopped' && !interrupted.again) waiting.unshift({ ...interrupted, again: true });
    else interrupted?.reject(new EngineRefusal({ code: reason === 'stopped' ? 'stopped' : 'worker_died' }));
    if (failed) failed(new EngineRefusal({ code: reason }));
    await revive(reason);
  }

  async function revive(reason) {
    const questions = waiting;
    waiting = [];
    await launch();
    for (const task of REMEMBERED) {
      if (remembered.has(task)) await ask(task, remembered.get(task));
    }
    onDeath(reason);
    waiting.push(...questions);
    next();
  }

  /**
   * @param {string} task
   * @param {object} request
   * @param {{ key?: string, onProgress?: Question['onProgress'] }} [options]
   * @returns {Promise<any>}
   */
  function ask(task, request, { key, onProgress } = {}) {
    return new Promise((resolve, reject) => {
      const overtaken = waiting.filter((question) => key && question.key === key);
      waiting = waiting.filter((question) => !overtaken.includes(question));
      for (const question of overtaken) question.reject(new EngineRefusal({ code: 'superseded' }));
      ids += 1;
      waiting.push({ id: ids, task, request, key, onProgress, resolve, reject });
      next();
    });
  }

  await launch();
  return {
    ask,
    /** End what is being worked on by ending the worker, and start it again with its register. */
    stop() {
      if (current) died('stopped', null);
    },
  };
}

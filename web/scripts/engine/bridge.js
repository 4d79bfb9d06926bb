/**
 * The page's only way to the worker. Questions go in one after another; each gets its answer
 * or a refusal; a worker that dies is started again and given its register again.
 */
import { prepareLives, WorkerDeath } from './life.js';
import { EngineRefusal } from './refusal.js';

export { EngineRefusal };

/** Tasks that put something into the engine's memory; the last of each is repeated after a restart. */
const OPENS = 'register.open';
const BUILDS = 'register.build';
const FORGETS = 'register.forget';

/** A question that was being worked on when the worker died is asked once more, never again. */
const MOST_ATTEMPTS = 2;

/**
 * @typedef {object} Question
 * @property {string} task
 * @property {any} request
 * @property {string} [key] a later question with the same key takes this one's place
 * @property {(stage: string, done: number, total: number) => void} [onProgress]
 * @property {(answer: any) => void} resolve
 * @property {(refusal: EngineRefusal) => void} reject
 * @property {boolean} [stopped] the person no longer wants it
 */

/**
 * Start the engine from the unpacked members of the pack. The page must be sealed before.
 *
 * `onDeath` hears why after each restart: "out_of_memory", "internal" or "stopped" when everything
 * is as it was; "register_lost" when the register could not be opened again; "gone" when no worker
 * could be started again (the next question tries once more).
 * @param {{
 *   members: Map<string, Uint8Array>,
 *   onStage: (stage: string, done: number, total: number) => void,
 *   onDeath: (reason: string) => void,
 * }} options
 */
export async function startEngine({ members, onStage, onDeath }) {
  const begin = await prepareLives(members);
  /** @type {Question[]} */
  let waiting = [];
  /** @type {Question|null} */
  let current = null;
  /** What would have to be asked again of a new worker. @type {Map<string, any>} */
  const remembered = new Map();
  /** @type {Awaited<ReturnType<typeof begin>>|null} */
  let life = null;
  /** @type {Promise<void>|null} */
  let reviving = null;

  async function launch() {
    life = await begin(onStage);
    // Most deaths meet a question and are dealt with there; one that meets none is dealt with at once.
    life.died.then((death) => {
      if (!current) revive(death.reason);
    });
  }

  /** Start the worker again and give it its register; at most one revival at a time. */
  function revive(reason) {
    reviving ??= restart(reason).finally(() => {
      reviving = null;
    });
    return reviving;
  }

  async function restart(reason) {
    life = null;
    try {
      await launch();
      const back = await replay();
      if (!life) await launch();
      onDeath(back ? reason : 'register_lost');
    } catch (fault) {
      if (!(fault instanceof WorkerDeath)) throw fault;
      life = null;
      onDeath('gone');
    }
  }

  /** Whether everything remembered was taken; what was not is forgotten, so that it can kill only once. */
  async function replay() {
    for (const task of [OPENS, BUILDS]) {
      if (!remembered.has(task)) continue;
      try {
        await life.ask(task, remembered.get(task));
      } catch (fault) {
        remembered.clear();
        if (fault instanceof WorkerDeath) life = null;
        return false;
      }
    }
    return true;
  }

  async function carryOut(question) {
    for (let attempt = 1; attempt <= MOST_ATTEMPTS; attempt += 1) {
      if (reviving) await reviving;
      if (!life) await revive('internal');
      if (question.stopped) throw new EngineRefusal({ code: 'stopped' });
      if (!life) break;
      try {
        return await life.ask(question.task, question.request, question.onProgress);
      } catch (fault) {
        if (!(fault instanceof WorkerDeath)) throw fault;
        await revive(fault.reason);
        if (fault.reason === 'stopped') throw new EngineRefusal({ code: 'stopped' });
        if (overtaken(question)) throw new EngineRefusal({ code: 'superseded' });
      }
    }
    throw new EngineRefusal({ code: 'worker_died' });
  }

  const overtaken = ({ key }) => key !== undefined && waiting.some((later) => later.key === key);

  function remember({ task, request }) {
    // A new register makes what was built from the one before it meaningless.
    if (task === OPENS || task === FORGETS) remembered.clear();
    if (task === OPENS || task === BUILDS) remembered.set(task, request);
  }

  async function work() {
    while (waiting.length) {
      current = waiting.shift();
      try {
        const answer = await carryOut(current);
        remember(current);
        current.resolve(answer);
      } catch (refusal) {
        current.reject(refusal);
      }
      // A worker that ran out of memory ends with its answer: start again before the next question.
      if (life?.ended) await revive(life.ended);
      current = null;
    }
  }

  /**
   * Ask a task of the desk. Rejects with an EngineRefusal: the desk's own, or "superseded", "stopped",
   * "worker_died", "out_of_memory", "internal".
   * @param {string} task
   * @param {object} request JSON-safe, except `content` of register.open, which is bytes
   * @param {{ key?: string, onProgress?: Question['onProgress'] }} [options]
   * @returns {Promise<any>}
   */
  function ask(task, request, { key, onProgress } = {}) {
    return new Promise((resolve, reject) => {
      for (const question of waiting.filter((earlier) => key !== undefined && earlier.key === key)) {
        question.reject(new EngineRefusal({ code: 'superseded' }));
      }
      waiting = waiting.filter((earlier) => key === undefined || earlier.key !== key);
      waiting.push({ task, request, key, onProgress, resolve, reject });
      if (!current) work();
    });
  }

  /** End what is being worked on by ending the worker, and start it again with its register. */
  function stop() {
    if (!current) return;
    current.stopped = true;
    if (!reviving) life?.end('stopped');
  }

  try {
    await launch();
  } catch (fault) {
    throw fault instanceof WorkerDeath ? new EngineRefusal({ code: fault.reason }) : fault;
  }
  return { ask, stop };
}

/** From the shell to a sealed page with its engine running. */
import { startEngine } from './engine/bridge.js';
import { loadPack } from './engine/pack.js';
import { provesSealed, seal } from './engine/seal.js';

/**
 * The order matters: everything is fetched, then the page is sealed, and only then is there
 * a worker and a way to open a register.
 * @param {import('./app.js').App} app
 */
export async function start(app) {
  const stage = (name, done, total) => told(app, { stage: name, done, total });
  try {
    const members = await loadPack(stage);
    app.demo = members.get('demo') ?? null;
    seal(document);
    const proof = await provesSealed();
    told(app, { sealed: proof });
    app.engine = await startEngine({
      members,
      onStage: stage,
      onDeath: (reason) => told(app, { revived: reason }),
    });
    const { version } = await app.engine.ask('about', {});
    told(app, { ready: true, version });
  } catch (failure) {
    told(app, { failure: failure.code ?? 'internal' });
    if (!failure.code) throw failure;
  }
}

function told(app, news) {
  app.store.change({ engine: { ...app.store.state.engine, ...news } });
}

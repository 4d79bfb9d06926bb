/** The engine pack: fetched with progress and checked, or taken from the page itself in the one-file copy. */
import { EngineRefusal } from './refusal.js';

/**
 * @typedef {{ name: string, file: string, bytes: number, size: number, integrity: string }} Member
 */

/**
 * @param {(stage: string, done: number, total: number) => void} onStage
 * @returns {Promise<Map<string, Uint8Array>>} the unpacked members by name
 */
export async function loadPack(onStage) {
  refuseOldBrowsers();
  /** @type {{ members: Member[] }} */
  const manifest = JSON.parse(document.getElementById('pack').textContent);
  const total = manifest.members.reduce((sum, member) => sum + member.bytes, 0);
  let done = 0;
  const arrived = (bytes) => {
    done += bytes;
    onStage('engine-stage-fetching', done, total);
  };
  const packed = await Promise.all(manifest.members.map((member) => bytesOf(member, arrived)));
  onStage('engine-stage-unpacking', 0, 0);
  const members = new Map();
  for (const [i, member] of manifest.members.entries()) members.set(member.name, await unpacked(packed[i], member));
  return members;
}

function refuseOldBrowsers() {
  const needed = [globalThis.WebAssembly?.instantiateStreaming, globalThis.DecompressionStream, globalThis.Worker];
  if (needed.some((each) => each === undefined)) throw new EngineRefusal({ code: 'too_old' });
}

/** @param {Member} member @param {(bytes: number) => void} arrived */
async function bytesOf(member, arrived) {
  const inside = document.getElementById(`pack-${member.name}`);
  if (inside) {
    const bytes = fromBase64(inside.textContent);
    inside.remove();
    arrived(bytes.length);
    return bytes;
  }
  try {
    const answer = await fetch(member.file, { integrity: member.integrity, cache: 'force-cache', credentials: 'omit' });
    if (!answer.ok) throw new EngineRefusal({ code: 'network' });
    return await readCounting(answer, arrived);
  } catch (fault) {
    if (fault instanceof EngineRefusal) throw fault;
    // The browser gives one error for a broken connection and for bytes that do not match.
    throw new EngineRefusal({ code: (await reachable(member)) ? 'integrity' : 'network' });
  }
}

async function reachable(member) {
  try {
    return (await fetch(member.file, { method: 'HEAD', cache: 'no-store' })).ok;
  } catch {
    return false;
  }
}

async function readCounting(answer, arrived) {
  const chunks = [];
  for (const reader = answer.body.getReader(); ;) {
    const { done, value } = await reader.read();
    if (done) break;
    chunks.push(value);
    arrived(value.length);
  }
  return new Uint8Array(await new Blob(chunks).arrayBuffer());
}

function fromBase64(text) {
  // @ts-ignore - newer than the type library
  if (Uint8Array.fromBase64) return Uint8Array.fromBase64(text.trim());
  const binary = atob(text.trim());
  const bytes = new Uint8Array(binary.length);
  for (let i = 0; i < binary.length; i += 1) bytes[i] = binary.charCodeAt(i);
  return bytes;
}

/** @param {Uint8Array} packed @param {Member} member */
async function unpacked(packed, member) {
  try {
    const stream = new Blob([/** @type {BlobPart} */ (packed)]).stream().pipeThrough(new DecompressionStream('gzip'));
    const bytes = new Uint8Array(await new Response(stream).arrayBuffer());
    if (bytes.length === member.size) return bytes;
  } catch {
    // Said below, together with a wrong size.
  }
  throw new EngineRefusal({ code: 'integrity' });
}

/** The seal: from here on the browser refuses every request of this page and of its worker. */
import policies from './policy.json';

const PATIENCE_MS = 3000;

/** Put the sealing policy beside the one the page came with; it can be added but never taken away. */
export function seal(document) {
  const meta = document.createElement('meta');
  meta.setAttribute('http-equiv', 'Content-Security-Policy');
  meta.setAttribute('content', policies.sealed);
  document.head.append(meta);
  closeSideDoors();
}

/** What no policy of today closes: ways out that are taken away before a register can be opened. */
function closeSideDoors() {
  for (const name of ['RTCPeerConnection', 'webkitRTCPeerConnection', 'RTCDataChannel', 'WebTransport', 'open']) {
    if (name in globalThis) Object.defineProperty(globalThis, name, { value: undefined, writable: false, configurable: false });
  }
  globalThis.navigation?.addEventListener('navigate', stayHere);
}

/** A page may move to an address that carries data away; only this page, saved files and a reload are let through. */
function stayHere(event) {
  const here = new URL(location.href);
  const next = new URL(event.destination.url);
  here.hash = '';
  next.hash = '';
  const harmless = next.href === here.href || event.downloadRequest !== null || event.navigationType === 'traverse';
  if (!harmless && event.cancelable) event.preventDefault();
}

/**
 * Try harmless requests and see the browser refuse them: to the page's own address, or, from a file, to a port of this
 * machine where nobody answers (a browser may turn down a file's request before it asks the policy).
 * @returns {Promise<{ sealed: boolean, tried: number, refused: number }>}
 */
export async function provesSealed() {
  const attempts = [tryFetch, tryImage];
  const refused = (await Promise.all(attempts.map((attempt) => attempt()))).filter(Boolean).length;
  return { sealed: refused === attempts.length, tried: attempts.length, refused };
}

/** True when the policy itself, not a missing network, refused the request. */
function refusedByPolicy(directive, request) {
  return new Promise((settle) => {
    const heard = (event) => {
      if (event.effectiveDirective !== directive) return;
      document.removeEventListener('securitypolicyviolation', heard);
      settle(true);
    };
    document.addEventListener('securitypolicyviolation', heard);
    setTimeout(() => settle(false), PATIENCE_MS);
    request();
  });
}

const NOBODY = 'http://127.0.0.1:9/';
const there = (name) => new URL(name, location.protocol === 'file:' ? NOBODY : document.baseURI).href;

const tryFetch = () => refusedByPolicy('connect-src', () => fetch(there('seal-proof'), { cache: 'no-store' }).catch(() => null));

const tryImage = () => refusedByPolicy('img-src', () => {
  new Image().src = there('seal-proof.png');
});

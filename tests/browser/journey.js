// The shortest way from an open page to a curve, and every request afterwards, in any browser.
// A driver calls it with an address of a server that is listening and waits for what it returns.
async (there) => {
  const sleep = (ms) => new Promise((then) => { setTimeout(then, ms); });
  const until = async (what, found) => {
    for (let waited = 0; waited < 120_000; waited += 100) {
      const value = found();
      if (value) return value;
      await sleep(100);
    }
    throw new Error(`waited in vain for ${what}: ${document.querySelector('main').innerText.slice(0, 400)}`);
  };
  const find = (selector) => document.querySelector(selector);
  await until('the engine', () => !find('#engine-progress') && find('#engine-state .sealed') && !find('#open-demo').disabled);
  find('#open-demo').click();
  await until('the register', () => find('#understood-heading ~ .sentence'));
  const register = find('#understood-heading ~ .sentence').textContent;
  location.hash = 'outcomes';
  await until('the curve', () => find('#survival svg'));
  const survival = (await until('its sentence', () => find('#survival .sentence'))).textContent;
  location.hash = 'compare';
  const attempts = [
    () => fetch(`${there}fetch`),
    () => { const asked = new XMLHttpRequest(); asked.open('GET', `${there}xhr`); asked.send(); },
    () => navigator.sendBeacon(`${there}beacon`, 'x'),
    () => new WebSocket(`${there.replace('http', 'ws')}socket`),
    () => { new Image().src = `${there}image.png`; },
    () => { const form = document.createElement('form'); form.action = `${there}form`; document.body.append(form); form.submit(); },
    () => { const frame = document.createElement('iframe'); frame.src = `${there}frame`; document.body.append(frame); },
    () => { const script = document.createElement('script'); script.src = `${there}script.js`; document.head.append(script); },
    () => new Worker(URL.createObjectURL(new Blob([`fetch('${there}worker'); importScripts('${there}imported.js');`]))),
  ];
  for (const attempt of attempts) {
    try {
      await Promise.race([attempt(), sleep(300)]);
    } catch { /* refused, as it should be */ }
  }
  await sleep(600);
  return { register, survival, sealed: find('#engine-state .sealed').textContent, compare: Boolean(find('#place-compare')) };
}

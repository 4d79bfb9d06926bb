/** Carry out the journey in Firefox through WebDriver BiDi; print what it returns as JSON. */
import { readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import { pathToFileURL } from 'node:url';

const [firefox, web, address, there] = process.argv.slice(2);
const found = createRequire(`${web}/`).resolve('puppeteer-core');
const { default: puppeteer } = await import(pathToFileURL(found).href);
const browser = await puppeteer.launch({ browser: 'firefox', executablePath: firefox, headless: true, protocolTimeout: 240_000 });
try {
  const page = await browser.newPage();
  await page.goto(address);
  const journey = await readFile(new URL('journey.js', import.meta.url), 'utf8');
  const said = await page.evaluate(`(${journey.slice(journey.indexOf('async ('))})(${JSON.stringify(there)})`);
  console.log(JSON.stringify({ ...said, browser: await browser.version() }));
} finally {
  await browser.close();
}

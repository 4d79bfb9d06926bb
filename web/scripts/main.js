/** The page: its shell at once, then the engine, then the seal, then the patients. */
import { makeApp } from './app.js';
import { drawShell } from './shell.js';
import { start } from './start.js';
import { preferredLanguage } from './words.js';

const app = makeApp(preferredLanguage());
drawShell(app);
start(app);

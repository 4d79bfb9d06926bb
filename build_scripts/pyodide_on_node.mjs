/**
 * Runs one Python file inside Pyodide on Node.
 *
 *   node pyodide_on_node.mjs JOB.json
 *
 * The job: { runtime: folder of Pyodide's files, archives: [{ path, into }], mounts: { "/inside": "outside" },
 * script: path of a Python file }. Archives are zip files (wheels are). What the script assigns to
 * `result` is printed as the last line, as JSON.
 */
import { readFileSync } from 'node:fs';
import { pathToFileURL } from 'node:url';

const job = JSON.parse(readFileSync(process.argv[2], 'utf8'));
const { loadPyodide } = await import(pathToFileURL(`${job.runtime}/pyodide.mjs`));
const python = await loadPyodide({ indexURL: job.runtime, stdout: (line) => process.stderr.write(`${line}\n`) });
for (const { path, into } of job.archives) {
  python.unpackArchive(new Uint8Array(readFileSync(path)), 'zip', { extractDir: into });
}
for (const [inside, outside] of Object.entries(job.mounts)) python.mountNodeFS(inside, outside);
python.FS.writeFile('/script.py', readFileSync(job.script));
const result = python.runPython(`
import json, runpy
json.dumps(runpy.run_path('/script.py', run_name='__main__').get('result'))
`);
console.log(result);

// Makes a fresh clone ready and then runs an npm script: `node src/build/setup.mjs SCRIPT [ARGUMENT…]`. It runs on
// whatever Node the machine has, without dependencies; the script itself runs on the pinned Node of node_modules.
import { spawnSync } from 'node:child_process';
import { existsSync, statSync } from 'node:fs';
import { dirname, join } from 'node:path';
import process from 'node:process';
import { fileURLToPath } from 'node:url';

const root = join(dirname(fileURLToPath(import.meta.url)), '../..');
const modules = join(root, 'node_modules');
const OLDEST_NODE = 20;

const [script, ...rest] = process.argv.slice(2);
if (script === undefined) throw new Error('setup.mjs needs the name of an npm script');
requireNode();
if (!isInstalled()) install();
process.exit(npm(['run', '--silent', script, ...(rest.length > 0 ? ['--', ...rest] : [])]));

function requireNode() {
  const major = Number(process.versions.node.split('.')[0]);
  if (major >= OLDEST_NODE) return;
  console.error(`Node ${OLDEST_NODE} or newer is needed; this is Node ${process.versions.node}.`);
  process.exit(2);
}

/** npm writes node_modules/.package-lock.json at the end of an install; an older one than the lock file is out of date. */
function isInstalled() {
  const installed = join(modules, '.package-lock.json');
  if (!existsSync(installed) || !pinnedNodeRuns()) return false;
  return statSync(installed).mtimeMs >= statSync(join(root, 'package-lock.json')).mtimeMs;
}

function install() {
  console.log('Installing what the project is built with (npm ci) …');
  // Only errors: on an older Node, npm warns of every tool that wants a newer one, and they get it.
  const status = npm(['ci', '--loglevel=error', '--no-progress']);
  if (status !== 0) process.exit(status);
  if (pinnedNodeRuns()) return;
  // A machine may be set to run no install scripts. These two are needed, and both are pinned.
  npm(['rebuild', 'node', 'esbuild', '--ignore-scripts=false', '--loglevel=error']);
  if (pinnedNodeRuns()) return;
  console.error('The pinned Node could not be installed: node_modules/node has no program.');
  process.exit(1);
}

function pinnedNodeRuns() {
  const program = join(modules, 'node/bin', process.platform === 'win32' ? 'node.exe' : 'node');
  return existsSync(program) && spawnSync(program, ['--version']).status === 0;
}

/** Runs npm in the project's folder, the same npm that started this script where one did. */
function npm(parameters) {
  const npmProgram = process.env.npm_execpath;
  const [command, first] = npmProgram?.endsWith('.js') ? [process.execPath, [npmProgram]] : ['npm', []];
  const shell = command === 'npm' && process.platform === 'win32';
  const { status, error } = spawnSync(command, [...first, ...parameters], { cwd: root, stdio: 'inherit', shell });
  if (error) console.error(error.message);
  return status ?? 1;
}

// The VS Code server of the npm package code-server: a real workbench where VS Code itself cannot be downloaded. It is a
// tool of the test machine, kept in .editor/, and no dependency of the project.
import { spawn, spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import process from 'node:process';

export const VERSION = '4.139.1';

/** Installs it where it is missing: some 600 MB, two minutes. Debian's libkrb5-dev and a compiler must be there. */
export function installEditor(root) {
  const folder = join(root, '.editor');
  const main = join(folder, 'node_modules/code-server/lib/vscode/out/server-main.js');
  if (existsSync(main)) return main;
  mkdirSync(folder, { recursive: true });
  writeFileSync(join(folder, 'package.json'), '{ "private": true }\n');
  console.log(`Installing code-server ${VERSION} into .editor/ …`);
  const parameters = ['install', `code-server@${VERSION}`, '--loglevel=error', '--no-progress', '--no-package-lock'];
  // Its install script takes the word of an npm further out for the version of Node.
  const own = Object.entries(process.env).filter(([name]) => !/^npm_/i.test(name));
  const { status } = spawnSync('npm', parameters, { cwd: folder, env: Object.fromEntries(own), stdio: 'inherit' });
  if (status !== 0 || !existsSync(main)) throw new Error('code-server could not be installed');
  return main;
}

/**
 * Starts a server of its own, with empty settings folders. `vsix`: a package to install first, as a user does.
 * Resolves with its port, and a function that ends it and removes the folders.
 */
export async function startEditor(main, { environment = {}, settings = {}, vsix } = {}) {
  const port = await freePort();
  const data = mkdtempSync(join(tmpdir(), 'tautline-editor-'));
  const folders = ['--extensions-dir', join(data, 'extensions'), '--server-data-dir', data];
  if (vsix !== undefined) install(main, vsix, folders);
  mkdirSync(join(data, 'data/Machine'), { recursive: true });
  writeFileSync(join(data, 'data/Machine/settings.json'), JSON.stringify(settings));
  const server = spawn(
    process.execPath,
    [
      main,
      ...['--host', '127.0.0.1', '--port', String(port), '--without-connection-token'],
      ...['--accept-server-license-terms', '--enable-smoke-test-driver', '--disable-workspace-trust'],
      ...['--telemetry-level', 'off', ...folders],
    ],
    { env: { ...process.env, ...environment }, stdio: ['ignore', 'pipe', 'pipe'] },
  );
  let output = '';
  const heard = chunk => {
    output += chunk;
  };
  server.stdout.setEncoding('utf8').on('data', heard);
  server.stderr.setEncoding('utf8').on('data', heard);
  const ended = new Promise(resolve => server.once('exit', resolve));
  const stop = async () => {
    server.kill('SIGTERM');
    await Promise.race([ended, pause(5000)]);
    if (server.exitCode === null) server.kill('SIGKILL');
    rmSync(data, { recursive: true, force: true, maxRetries: 5 });
  };
  for (let tries = 0; tries < 120; tries += 1) {
    if (server.exitCode !== null) break;
    const answer = await fetch(`http://127.0.0.1:${port}/`).catch(() => undefined);
    if (answer?.ok) return { port, stop, output: () => output };
    await pause(250);
  }
  await stop();
  throw new Error(`the VS Code server did not start:\n${output}`);
}

function install(main, vsix, folders) {
  const parameters = [main, '--install-extension', vsix, '--accept-server-license-terms', ...folders];
  const { status, stdout, stderr } = spawnSync(process.execPath, parameters, { encoding: 'utf8' });
  if (status !== 0) throw new Error(`${vsix} could not be installed:\n${stdout}${stderr}`);
}

export function pause(milliseconds) {
  return new Promise(resolve => setTimeout(resolve, milliseconds));
}

function freePort() {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const { port } = probe.address();
      probe.close(() => resolve(port));
    });
  });
}

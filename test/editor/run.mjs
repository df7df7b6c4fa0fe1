// The editor suite in a real VS Code: `node test/editor/run.mjs [desktop|server|installed|web]`. `desktop`
// downloads VS Code, `server` uses the VS Code server in Chromium, `installed` the same with the packaged extension,
// installed as a user does, `web` VS Code for the Web; without a word it is the desktop where that can be had, and the
// server otherwise.
import { cpSync, existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import process from 'node:process';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';
import { openBrowser, workbenchAddress } from './browser.mjs';
import { installEditor, pause, startEditor } from './code-server.mjs';
import { installWebWorkbench, startWebWorkbench } from './web.mjs';

const root = join(dirname(fileURLToPath(import.meta.url)), '../..');
const suite = join(root, 'out/editor/suite.cjs');
const LIMIT = 240_000;

const BUNDLE = {
  absWorkingDir: root,
  outdir: 'out/editor',
  bundle: true,
  format: 'cjs',
  external: ['vscode'],
  loader: { '.md': 'text' },
};

const work = mkdtempSync(join(tmpdir(), 'tautline-suite-'));
const folder = join(work, 'workspace');
const resultsFile = join(work, 'results.json');
cpSync(join(root, 'test/editor/workspace'), folder, { recursive: true });
cpSync(join(root, 'media/sample'), join(folder, 'sample'), { recursive: true });

try {
  report(await (await runner())());
} finally {
  rmSync(work, { recursive: true, force: true, maxRetries: 5 });
}

async function runner() {
  const [asked = process.env.TAUTLINE_EDITOR] = process.argv.slice(2);
  if (asked === 'server') return inServer;
  if (asked === 'installed') return inServerInstalled;
  if (asked === 'web') return onWeb;
  const { downloadAndUnzipVSCode } = await import('@vscode/test-electron');
  try {
    const program = await downloadAndUnzipVSCode({ version: 'stable', cachePath: join(root, '.vscode-test') });
    return () => onDesktop(program);
  } catch (error) {
    if (asked === 'desktop') throw error;
    console.log('VS Code cannot be downloaded here; the suite runs in the VS Code server.');
    return inServer;
  }
}

async function onDesktop(vscodeExecutablePath) {
  await bundleForNode();
  const { runTests } = await import('@vscode/test-electron');
  await runTests({
    vscodeExecutablePath,
    extensionDevelopmentPath: root,
    extensionTestsPath: suite,
    extensionTestsEnv: { TAUTLINE_RESULTS: resultsFile },
    launchArgs: [folder, '--disable-extensions', '--disable-workspace-trust'],
  });
  return readResults();
}

function inServer() {
  return runInServer(root);
}

/** The extension under development is an empty one: it only brings the suite along. */
async function inServerInstalled() {
  await import('../../src/build/package.mjs');
  const bearer = join(work, 'bearer');
  mkdirSync(bearer);
  const manifest = { name: 'suite', publisher: 'tautline', version: '0.0.0', engines: { vscode: '*' } };
  writeFileSync(join(bearer, 'package.json'), JSON.stringify(manifest));
  return runInServer(bearer, join(root, 'out/tautline.vsix'));
}

async function runInServer(extension, vsix) {
  await bundleForNode();
  const environment = { TAUTLINE_RESULTS: resultsFile };
  const server = await startEditor(installEditor(root), { environment, vsix });
  const browser = await openBrowser();
  try {
    const page = await browser.newPage();
    await page.goto(workbenchAddress(server.port, { folder, extension, suite }));
    const end = Date.now() + LIMIT;
    while (!existsSync(resultsFile) && Date.now() < end) await pause(250);
    if (!existsSync(resultsFile)) await giveUp(page, server.output());
    return readResults();
  } finally {
    await browser.close();
    await server.stop();
  }
}

async function onWeb() {
  const server = await startWebWorkbench(root, installWebWorkbench(root), bundleForWeb);
  const browser = await openBrowser();
  try {
    const page = await browser.newPage();
    let output = '';
    page.on('console', message => {
      output += `${message.text()}\n`;
    });
    await page.goto(server.address);
    return await Promise.race([server.results, pause(LIMIT).then(() => giveUp(page, output))]);
  } finally {
    await browser.close();
    await server.stop();
  }
}

function bundleForNode() {
  const entryPoints = { suite: 'test/editor/suite/index.ts' };
  return build({ ...BUNDLE, entryPoints, platform: 'node', outExtension: { '.js': '.cjs' } });
}

function bundleForWeb(resultsAddress) {
  const entryPoints = { 'suite-web': 'test/editor/suite/web.ts' };
  const define = { RESULTS_ADDRESS: JSON.stringify(resultsAddress) };
  return build({ ...BUNDLE, entryPoints, platform: 'browser', define });
}

function readResults() {
  return existsSync(resultsFile) ? JSON.parse(readFileSync(resultsFile, 'utf8')) : [];
}

async function giveUp(page, output) {
  mkdirSync(join(root, 'out/editor'), { recursive: true });
  await page.screenshot({ path: join(root, 'out/editor/stuck.png') });
  throw new Error(`the suite did not end within ${LIMIT / 1000} s (see out/editor/stuck.png)\n${output}`);
}

/** `results`: `{ name, error? }` for each test, in order. No result at all is a failure. */
function report(results) {
  for (const { name, error } of results) console.log(error === undefined ? `  ✓ ${name}` : `  ✗ ${name}\n${error}`);
  const failed = results.length === 0 ? 1 : results.filter(({ error }) => error !== undefined).length;
  const passed = results.length === 0 ? 0 : results.length - failed;
  if (process.env.TAUTLINE_TOTALS !== undefined) {
    writeFileSync(process.env.TAUTLINE_TOTALS, JSON.stringify({ passed, failed }));
  }
  console.log(`\n${passed} passed, ${failed} failed`);
  process.exitCode = failed === 0 ? 0 : 1;
}

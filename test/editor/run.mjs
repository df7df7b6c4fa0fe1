// The editor suite in a real VS Code: `node test/editor/run.mjs [server|desktop]`. `desktop` downloads VS Code,
// `server` uses the VS Code server in Chromium; without a word it is the desktop where that can be had.
import { cpSync, existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import process from 'node:process';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';
import { openBrowser, workbenchAddress } from './browser.mjs';
import { installEditor, pause, startEditor } from './code-server.mjs';

const root = join(dirname(fileURLToPath(import.meta.url)), '../..');
const suite = join(root, 'out/editor/suite.cjs');
const LIMIT = 240_000;

await build({
  absWorkingDir: root,
  entryPoints: { suite: 'test/editor/suite/index.ts' },
  outdir: 'out/editor',
  outExtension: { '.js': '.cjs' },
  bundle: true,
  platform: 'node',
  format: 'cjs',
  external: ['vscode'],
});

const work = mkdtempSync(join(tmpdir(), 'tautline-suite-'));
const folder = join(work, 'workspace');
const resultsFile = join(work, 'results.json');
cpSync(join(root, 'test/editor/workspace'), folder, { recursive: true });
cpSync(join(root, 'media/sample'), join(folder, 'sample'), { recursive: true });

try {
  await (await runner())({ TAUTLINE_RESULTS: resultsFile });
  report(existsSync(resultsFile) ? JSON.parse(readFileSync(resultsFile, 'utf8')) : []);
} finally {
  rmSync(work, { recursive: true, force: true, maxRetries: 5 });
}

async function runner() {
  const [asked = process.env.TAUTLINE_EDITOR] = process.argv.slice(2);
  if (asked === 'server') return inServer;
  const { downloadAndUnzipVSCode } = await import('@vscode/test-electron');
  try {
    const program = await downloadAndUnzipVSCode({ version: 'stable', cachePath: join(root, '.vscode-test') });
    return environment => onDesktop(program, environment);
  } catch (error) {
    if (asked === 'desktop') throw error;
    console.log('VS Code cannot be downloaded here; the suite runs in the VS Code server.');
    return inServer;
  }
}

async function onDesktop(vscodeExecutablePath, extensionTestsEnv) {
  const { runTests } = await import('@vscode/test-electron');
  await runTests({
    vscodeExecutablePath,
    extensionDevelopmentPath: root,
    extensionTestsPath: suite,
    extensionTestsEnv,
    launchArgs: [folder, '--disable-extensions', '--disable-workspace-trust'],
  });
}

async function inServer(environment) {
  const server = await startEditor(installEditor(root), { environment });
  const browser = await openBrowser();
  try {
    const page = await browser.newPage();
    await page.goto(workbenchAddress(server.port, { folder, extension: root, suite }));
    const end = Date.now() + LIMIT;
    while (!existsSync(resultsFile) && Date.now() < end) await pause(250);
    if (existsSync(resultsFile)) return;
    mkdirSync(join(root, 'out/editor'), { recursive: true });
    await page.screenshot({ path: join(root, 'out/editor/stuck.png') });
    throw new Error(`the suite did not end within ${LIMIT / 1000} s (see out/editor/stuck.png)\n${server.output()}`);
  } finally {
    await browser.close();
    await server.stop();
  }
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

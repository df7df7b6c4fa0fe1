// The command line as it is shipped, in a process of its own.
import { spawn, spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';

const root = join(import.meta.dirname, '../..');
const cli = join(root, 'dist/cli.cjs');

describe('the bundle', () => {
  it('solves the sample project, whose one failure is its own', () => {
    const { status, stdout, stderr } = spawnSync(process.execPath, [cli, 'check', 'media/sample'], {
      cwd: root,
      encoding: 'utf8',
    });
    expect(stderr).toBe('');
    expect(stdout).toMatch(/\n6 notes, 33 of 34 requirements met, 1 not met\n$/);
    expect(status).toBe(1);
  });

  it('writes all of a long result into a pipe', () => {
    const { stdout } = spawnSync(process.execPath, [cli, 'check', '--json', 'media/sample'], {
      cwd: root,
      encoding: 'utf8',
    });
    expect(JSON.parse(stdout).notes).toHaveLength(6);
  });

  it('ends quietly when its reader has seen enough', () => {
    const { stderr } = spawnSync(
      'sh',
      ['-c', `"${process.execPath}" "${cli}" print media/sample/portal-frame.md | head -c 10`],
      {
        cwd: root,
        encoding: 'utf8',
      },
    );
    expect(stderr).toBe('');
  });

  it('serves an editor over standard streams', async () => {
    const server = spawn(process.execPath, [cli, 'language-server', '--stdio']);
    const message = (content: object): void => {
      const text = JSON.stringify({ jsonrpc: '2.0', ...content });
      server.stdin.write(`Content-Length: ${Buffer.byteLength(text)}\r\n\r\n${text}`);
    };
    message({ id: 1, method: 'initialize', params: { processId: null, rootUri: null, capabilities: {} } });
    const answer = await new Promise<string>((resolve, reject) => {
      let received = '';
      server.stdout.on('data', chunk => {
        received += chunk;
        if (received.includes('"capabilities"')) resolve(received);
      });
      server.once('exit', () => reject(new Error(`the server ended: ${received}`)));
    });
    expect(answer).toContain('hoverProvider');
    const ended = new Promise(resolve => server.once('exit', resolve));
    message({ id: 2, method: 'shutdown' });
    message({ method: 'exit' });
    await ended;
    expect(server.exitCode).toBe(0);
  });
});

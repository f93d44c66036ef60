import { existsSync, readdirSync, symlinkSync, writeFileSync } from 'node:fs';
import { request } from 'node:http';
import { connect } from 'node:net';
import { networkInterfaces } from 'node:os';
import { join } from 'node:path';
import { describe, expect, it, onTestFinished, vi } from 'vitest';
import { preview } from '../../src/cli/command-preview.js';
import { UsageError } from '../../src/cli/errors.js';
import { type PreviewState, startServer } from '../../src/cli/preview-server.js';
import { temporaryFolder, writeTree } from '../publish/temporary-folder.js';
import { smallPack } from './small-pack.js';

const state: PreviewState = { standing: 'Building', problems: '', failed: false, good: 0, page: null };

interface Answer {
  readonly status: number;
  readonly text: string;
  readonly headers: Readonly<Record<string, unknown>>;
}

/** Asks for a path exactly as written: no client tidies `..` away. */
function ask(address: string, path: string, options: { method?: string; host?: string } = {}): Promise<Answer> {
  const { hostname, port, host } = new URL(address);
  return new Promise((resolve, reject) => {
    const { method = 'GET' } = options;
    const headers = { host: options.host ?? host };
    request({ hostname, port, path, method, headers, agent: false }, (response) => {
      let text = '';
      response.setEncoding('utf8');
      response.on('data', (chunk) => {
        text += chunk;
      });
      response.on('end', () => resolve({ status: response.statusCode ?? 0, text, headers: response.headers }));
    })
      .on('error', reject)
      .end();
  });
}

async function serving() {
  const folder = temporaryFolder();
  writeTree(folder, {
    'site/index.html': '<p>top</p>',
    'site/pack/A/index.html': '<p>first</p>',
    'site/pack/A/data/pack.json': '{}',
    'site/.boardcase': 'marker',
    'site/pack/.secret/x.html': 'hidden',
    'secret.txt': 'outside',
  });
  symlinkSync(join(folder, 'secret.txt'), join(folder, 'site', 'link.txt'));
  symlinkSync(folder, join(folder, 'site', 'up'));
  const server = await startServer(join(folder, 'site'), 0, state);
  onTestFinished(() => server.close());
  return server;
}

describe('the server of a preview', () => {
  it('serves pages, data and the page around them, none of which is kept', async () => {
    const { address } = await serving();
    expect(await ask(address, '/site/pack/A/index.html')).toMatchObject({ status: 200, text: '<p>first</p>' });
    expect((await ask(address, '/site/pack/A/')).text).toBe('<p>first</p>');
    expect((await ask(address, '/site/')).text).toBe('<p>top</p>');
    const data = await ask(address, '/site/pack/A/data/pack.json?x=1');
    expect(data.headers).toMatchObject({ 'content-type': 'application/json', 'cache-control': 'no-store' });
    const shell = await ask(address, '/');
    expect(shell.text).toContain('<iframe');
    expect(shell.headers['content-security-policy']).toMatch(/default-src 'self'/);
    expect((await ask(address, '/-/preview.js')).headers['content-type']).toMatch(/javascript/);
    expect(await ask(address, '/site/', { method: 'HEAD' })).toMatchObject({ status: 200, text: '' });
  });

  it.each([
    '/site/../secret.txt',
    '/site/%2e%2e/secret.txt',
    '/site/..%2fsecret.txt',
    '/site/pack/..\\..\\secret.txt',
    '/site//etc/passwd',
    '/site/%00',
    '/site/%E0%A4%A',
    '/site/link.txt',
    '/site/up/secret.txt',
    '/site/.boardcase',
    '/site/pack/.secret/x.html',
    '/site/pack',
    '/site/none.html',
    '/-/../../package.json',
    '/secret.txt',
    '/../secret.txt',
  ])('refuses %s', async (path) => {
    const { address } = await serving();
    const { status, text } = await ask(address, path);
    expect(status).toBe(404);
    expect(text).not.toMatch(/outside|marker|hidden/);
  });

  it('answers to its own names only, and only reads', async () => {
    const { address } = await serving();
    const { port } = new URL(address);
    expect((await ask(address, '/', { host: `localhost:${port}` })).status).toBe(200);
    expect((await ask(address, '/', { host: `elsewhere.example:${port}` })).status).toBe(403);
    expect((await ask(address, '/site/', { method: 'POST' })).status).toBe(405);
  });

  it('listens on 127.0.0.1 and nowhere else', async () => {
    const { address } = await serving();
    expect(new URL(address).hostname).toBe('127.0.0.1');
    const port = Number(new URL(address).port);
    const reached = (host: string) =>
      new Promise<boolean>((resolve) => {
        const socket = connect({ host, port, timeout: 2000 });
        const end = (found: boolean) => {
          socket.destroy();
          resolve(found);
        };
        socket.on('connect', () => end(true));
        socket.on('error', () => end(false));
        socket.on('timeout', () => end(false));
      });
    expect(await reached('127.0.0.1')).toBe(true);
    const others = Object.values(networkInterfaces())
      .flat()
      .flatMap((entry) => (entry && !entry.internal ? [entry.address] : []));
    // 127.0.0.2 is this computer too, and reaches whatever listens on all interfaces.
    for (const host of ['127.0.0.2', '::1', ...others]) expect(await reached(host), host).toBe(false);
  });

  it('says which port is taken', async () => {
    const { address } = await serving();
    const port = Number(new URL(address).port);
    await expect(startServer('.', port, state)).rejects.toThrow(UsageError);
    await expect(startServer('.', port, state)).rejects.toThrow(new RegExp(`port ${port}: it is in use`));
  });
});

/** Reads the states that the page around the pages is told of, each once. */
async function listen(address: string) {
  const response = await fetch(`${address}-/events`);
  const reader = response.body!.pipeThrough(new TextDecoderStream()).getReader();
  let rest = '';
  const states: PreviewState[] = [];
  const next = async (): Promise<PreviewState> => {
    for (;;) {
      const told = states.shift();
      if (told) return told;
      const { value, done } = await reader.read();
      if (done) throw new Error('the preview ended');
      const messages = (rest + value).split('\n\n');
      rest = messages.pop() ?? '';
      states.push(...messages.map((message) => JSON.parse(message.slice('data: '.length))));
    }
  };
  return {
    /** The state after a number of good builds; a build that fails on the way is an error. */
    async good(count: number): Promise<PreviewState> {
      for (;;) {
        const told = await next();
        if (told.failed && told.standing.startsWith('Not built')) throw new Error(told.problems);
        if (told.good === count) return told;
      }
    },
    async failed(): Promise<PreviewState> {
      for (;;) {
        const told = await next();
        if (told.failed) return told;
      }
    },
  };
}

async function previewing(changes: Record<string, string | undefined> = {}) {
  const folder = temporaryFolder();
  const files = smallPack({ covered: true, requirements: ['r-flammability'] });
  const present = Object.entries({ ...files, ...changes }).flatMap(([path, text]) =>
    text === undefined ? [] : [[path, text] as const],
  );
  writeTree(folder, Object.fromEntries(present));
  const stop = new AbortController();
  const said: string[] = [];
  let announce = (_address: string) => {};
  const announced = new Promise<string>((resolve) => {
    announce = resolve;
  });
  const io = {
    out: (text: string) => {
      said.push(text);
      const found = /http:\S+/.exec(text);
      if (found) announce(found[0]);
    },
    err: (text: string) => void said.push(text),
    env: {},
  };
  const ended = preview(join(folder, 'pack.yaml'), { port: '0' }, io, stop.signal);
  onTestFinished(async () => {
    stop.abort();
    await ended;
  });
  const address = await announced;
  return {
    address,
    events: await listen(address),
    files,
    said,
    stop,
    ended,
    write: (path: string, text: string) => writeFileSync(join(folder, path), text),
  };
}

describe('boardcase preview', () => {
  it('builds, serves, and builds again when a file changes', async () => {
    const { address, events, files, write } = await previewing();
    const first = await events.good(1);
    expect(first.page).toBe('/site/quillback-small/A/index.html');
    expect((await ask(address, first.page!)).text).toContain('Quillback side radar, two candidate boards');
    write('pack.yaml', files['pack.yaml']!.replace('two candidate boards', 'a changed title'));
    await events.good(2);
    expect((await ask(address, first.page!)).text).toContain('a changed title');
  });

  it('shows the problems of a failed build and keeps the last good one, until they are mended', async () => {
    const { address, events, files, said, write } = await previewing();
    const first = await events.good(1);
    const before = await ask(address, first.page!);
    write('boards/qs-2.yaml', files['boards/qs-2.yaml']!.replace('kf-10', 'kf-99'));
    const failed = await events.failed();
    expect(failed.problems).toMatch(/^boards\/qs-2\.yaml:\d+:\d+[^\n]*\n[^\n]*kf-99/);
    expect(failed).toMatchObject({ good: 1, page: first.page });
    expect(said.join('\n')).toContain('kf-99');
    expect(await ask(address, first.page!)).toMatchObject({ text: before.text });
    write('boards/qs-2.yaml', files['boards/qs-2.yaml']!);
    expect(await events.good(2)).toMatchObject({ failed: false, problems: '' });
  });

  it('begins also with a pack that cannot be built, and waits for a file that is not there', async () => {
    const { events, files, write } = await previewing({ 'foils.yaml': undefined });
    const failed = await events.failed();
    expect(failed).toMatchObject({ good: 0, page: null, problems: expect.stringContaining('foils.yaml') });
    write('foils.yaml', files['foils.yaml']!);
    expect((await events.good(1)).failed).toBe(false);
  });

  it('stops serving and removes its own folder at the end', async () => {
    const temporary = temporaryFolder();
    vi.stubEnv('TMPDIR', temporary);
    onTestFinished(() => void vi.unstubAllEnvs());
    const { address, events, stop, ended } = await previewing();
    await events.good(1);
    expect(readdirSync(temporary).filter((name) => name.startsWith('boardcase-preview-'))).toHaveLength(1);
    stop.abort();
    expect(await ended).toBe(0);
    expect(readdirSync(temporary).filter((name) => name.startsWith('boardcase-preview-'))).toEqual([]);
    await expect(ask(address, '/')).rejects.toThrow(/ECONNREFUSED/);
  });

  it('keeps pages in the folder that it is given', async () => {
    const folder = temporaryFolder();
    writeTree(folder, smallPack({ covered: true, requirements: ['r-flammability'] }));
    const stop = new AbortController();
    const io = { out: (text: string) => void (text.startsWith('Built') && stop.abort()), err: () => {}, env: {} };
    const out = join(folder, 'out');
    await preview(join(folder, 'pack.yaml'), { port: '0', out }, io, stop.signal);
    expect(existsSync(join(out, 'quillback-small', 'A', 'index.html'))).toBe(true);
  });

  it.each(['-1', '70000', 'http'])('refuses the port %s', async (port) => {
    const folder = temporaryFolder();
    writeTree(folder, smallPack({ covered: true }));
    const io = { out() {}, err() {}, env: {} };
    const run = preview(join(folder, 'pack.yaml'), { port }, io, new AbortController().signal);
    await expect(run).rejects.toThrow(/the port is/);
  });
});

import assert from 'node:assert/strict';
import { readdirSync, readFileSync } from 'node:fs';
import { dirname, join, relative } from 'node:path';
import { fileURLToPath } from 'node:url';

const top = fileURLToPath(new URL('..', import.meta.url));

/** What each room may import besides itself. */
const allowed: Readonly<Record<string, readonly string[]>> = {
  'src/base': [],
  'src/quantity': ['src/base'],
  'src/network': ['src/base', 'src/quantity'],
  'src/study': ['src/network', 'src/base', 'src/quantity'],
  'src/solve': ['src/network', 'src/study', 'src/base', 'src/quantity'],
  'src/expression': ['src/base', 'src/quantity'],
  'src/description': ['src/base', 'src/quantity', 'src/expression', 'src/network', 'src/study'],
  'src/messages': [],
  'src/assistance': ['src/base', 'src/quantity', 'src/network', 'src/description', 'src/study', 'src/solve', 'src/messages'],
  'src/picture': ['src/messages', 'src/study', 'src/network'],
  'src/report': ['src/base', 'src/quantity', 'src/network', 'src/description', 'src/study', 'src/solve', 'src/assistance', 'src/picture', 'src/messages'],
  'src/worker': ['src/base', 'src/platform', 'src/network', 'src/study', 'src/solve', 'src/messages', 'src/description', 'src/assistance', 'src/report'],
  'src/platform': ['src/base', 'src/description', 'src/network'],
  'src/editor': ['src/base', 'src/quantity', 'src/network', 'src/description', 'src/study', 'src/solve', 'src/assistance', 'src/report', 'src/messages', 'src/platform', 'src/worker'],
  'src/cli': ['src/base', 'src/quantity', 'src/network', 'src/description', 'src/study', 'src/solve', 'src/assistance', 'src/report', 'src/platform', 'src/messages', 'src/worker'],
  webview: ['src/messages', 'src/picture'],
};

/** Packages that have one door each. */
const doors: Readonly<Record<string, (file: string) => boolean>> = {
  mathjs: (file) => file.startsWith('src/expression/'),
  yaml: (file) => file.startsWith('src/description/'),
  vscode: (file) => file.startsWith('src/editor/'),
  '@vscode/webview-ui-toolkit': (file) => file === 'webview/controls.ts',
};

const filesUnder = (folder: string): string[] =>
  readdirSync(join(top, folder), { withFileTypes: true }).flatMap((entry) => {
    const path = `${folder}/${entry.name}`;
    return entry.isDirectory() ? filesUnder(path) : entry.name.endsWith('.ts') ? [path] : [];
  });

const roomOf = (file: string): string => Object.keys(allowed).find((room) => file.startsWith(`${room}/`)) ?? file;

describe('the rooms of the house', () => {
  for (const file of [...filesUnder('src'), ...filesUnder('webview')]) {
    it(`${file} imports only what its room may`, () => {
      const text = readFileSync(join(top, file), 'utf8');
      for (const [, name] of text.matchAll(/(?:from|import)\s*\(?\s*'([^']+)'/g)) {
        if (name.startsWith('.')) {
          const target = roomOf(relative(top, join(top, dirname(file), name)).split('\\').join('/'));
          const room = roomOf(file);
          assert.ok(target === room || allowed[room].includes(target), `${file} imports ${name}`);
        } else if (name.startsWith('node:')) {
          assert.ok(file.startsWith('src/cli/') || file.startsWith('src/platform/') || file.startsWith('src/worker/'), `${file} imports ${name}`);
        } else if (Object.hasOwn(doors, name)) {
          assert.ok(doors[name](file), `${file} imports ${name}`);
        }
      }
    });
  }

  it('have no file of more than 400 lines', () => {
    const long = [...filesUnder('src'), ...filesUnder('webview')].filter((file) => readFileSync(join(top, file), 'utf8').split('\n').length > 400);
    assert.deepEqual(long, []);
  });
});

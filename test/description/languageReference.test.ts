import assert from 'node:assert/strict';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { keys } from '../../src/description/keys';
import { languageReference } from '../../src/description/languageReference';
import { marks, read } from './support';

const file = new URL('../../media/language-reference.md', import.meta.url);

/** A fragment with what a whole description needs besides. */
function whole(fragment: string): string {
  const required: [string, string][] = [['ohmward', 'ohmward: 1'], ['load', 'load: 18 - j37 Ω'], ['ladder', 'ladder: []']];
  return [fragment, ...required.filter(([key]) => !new RegExp(`^${key}:`, 'm').test(fragment)).map(([, line]) => line)].join('\n');
}

describe('the language reference', () => {
  const reference = languageReference();
  const examples = [...reference.matchAll(/```yaml\n([\s\S]*?)\n```/g)].map(([, text]) => text);

  it('stands in media as it is made here', () => {
    if (process.env.UPDATE_EXPECTED === '1') writeFileSync(file, reference);
    assert.ok(existsSync(file), 'UPDATE_EXPECTED=1 writes it');
    assert.equal(readFileSync(file, 'utf8'), reference);
  });

  it('has an example for each key', () => {
    assert.ok(examples.length > keys.filter((key) => key.place === 'description' || key.place === 'ladder entry').length);
    for (const { name } of keys) assert.ok(reference.includes(`\`${name}\``), name);
  });

  examples.forEach((example, i) => {
    it(`gives an example that reads without a mistake: ${i + 1}, ${example.split('\n')[0]}`, () => {
      const text = whole(example);
      assert.deepEqual(marks(text, read(text).diagnostics), []);
    });
  });

  it('gives snippets that read without a mistake once their holes are filled', () => {
    for (const { name, place, snippet } of keys) {
      const filled = snippet.replace(/\$\{\d\|([^,|]*)[^}]*\|\}/g, '$1').replace(/\$\{\d:([^}]*)\}/g, '$1');
      const text = whole({
        description: filled,
        'ladder entry': `ladder:\n  - ${filled}`,
        case: `load:\n  wet:\n    file: a.s1p\n${filled.startsWith('file') ? '' : filled.replace(/^/gm, '    ')}`,
        'measured item': `measured:\n  - ${(filled.startsWith('file') ? filled : `file: a.s1p\n${filled}`).replace(/\n/g, '\n    ')}`,
        firmware: `firmware:\n  header: a.h\n${filled.startsWith('header') ? '' : filled.replace(/^/gm, '  ')}`,
      }[place]);
      assert.deepEqual(marks(text, read(text).diagnostics), [], name);
    }
  });
});

import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import type { LoadedFiles } from '../../src/description/files';
import { tidy } from '../../src/description/tidy';
import { files, model, onePort, touchstone } from '../description/support';

const top = new URL('../../', import.meta.url);
const readJson = (path: string) => JSON.parse(readFileSync(fileURLToPath(new URL(path, top)), 'utf8'));

interface Snippet {
  readonly prefix: string;
  readonly description: string;
  readonly body: string | readonly string[];
}
const { snippets: contributed } = readJson('package.json').contributes as { snippets: { language: string; path: string }[] };
const snippets = readJson(contributed[0].path) as Readonly<Record<string, Snippet>>;

/** What the editor puts in where nobody types: each place's default, the first of its choices. Two blanks a tab. */
function expanded({ body }: Snippet): string {
  const defaults = new Map<string, string>();
  return [body].flat().join('\n').replaceAll('\t', '  ')
    .replace(/\$\{(\d+):([^}]*)\}|\$\{(\d+)\|([^}|]*)\|\}/g, (_, at: string, text: string, choiceAt: string, choices: string) => {
      const value = text ?? choices.split(',')[0];
      defaults.set(at ?? choiceAt, value);
      return value;
    })
    .replace(/\$(\d+)/g, (_, at: string) => defaults.get(at) ?? '');
}

const indented = (text: string) => text.replace(/^(?=.)/gm, '  ');

/** A description without what each snippet brings; invented. */
const sections: Readonly<Record<string, string>> = {
  bands: 'bands:\n  uplink: 863 .. 870 MHz\n',
  load: 'load: 18 - j37 Ω\n',
  ladder: 'ladder:\n  - series L9: 3.9 nH\n',
  parts: 'parts:\n  coils: inductor E24 1 nH .. 47 nH\n  caps: capacitor E24 0.5 pF .. 47 pF\n',
};
const minimal = (own: Readonly<Record<string, string>>) => `ohmward: 1\n${Object.values({ ...sections, ...own }).join('')}`;

const antenna = touchstone(onePort([800e6, 900e6, 1e9], () => ({ re: 18, im: -37 })));
const measured: LoadedFiles = files({ 'free-air.s1p': antenna, 'on-the-wall.s1p': antenna });
const antcap = 'tunables:\n  antcap: capacitor 5 bits 0.9 pF .. 4.6 pF\n';

/** Each snippet where it belongs. */
const placed: Readonly<Record<string, (text: string) => string>> = {
  'A whole description': (text) => text,
  Band: (text) => minimal({ bands: `${sections.bands}${indented(text)}\n` }),
  'Load cases': (text) => minimal({ load: text }),
  Families: (text) => minimal({ parts: text, ladder: 'ladder:\n  - series L9: 3.9 nH from coils\n  - shunt C9: 2.2 pF from caps\n' }),
  'Unknown part': (text) => minimal({ ladder: `${sections.ladder}${indented(text)}\n` }),
  'Whole ladder': (text) => minimal({ ladder: `${text}\n` }),
  Goals: (text) => minimal({ goals: text }),
  'Tunables and firmware': (text) => minimal({ tunables: text, ladder: `${sections.ladder}  - shunt C9: tunable antcap\n` }),
  'Tunable part': (text) => minimal({ tunables: antcap, ladder: `${sections.ladder}${indented(text)}\n` }),
};

describe('the snippets', () => {
  it('are those of package.json, for descriptions', () => {
    assert.deepEqual(contributed.map(({ language }) => language), ['ohmward']);
    assert.deepEqual(Object.keys(snippets), Object.keys(placed));
    const prefixes = Object.values(snippets).map(({ prefix }) => prefix);
    assert.equal(new Set(prefixes).size, prefixes.length);
  });

  for (const [name, snippet] of Object.entries(snippets)) {
    it(`${name}: reads without a remark where it belongs, and is laid out`, () => {
      const text = placed[name](expanded(snippet));
      assert.doesNotMatch(text, /\$|\t/);
      const { problem, diagnostics } = model(text, measured);
      assert.deepEqual(diagnostics.map(({ code, message }) => `${code}: ${message}`), [], text);
      assert.ok(problem);
      assert.equal(tidy(text).text.trimEnd(), text.trimEnd());
    });
  }
});

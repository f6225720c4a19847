import assert from 'node:assert/strict';
import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { XMLValidator } from 'fast-xml-parser';
import { FIRST_SAMPLE, SAMPLE_FILES } from '../../src/editor/sampleList';

const top = fileURLToPath(new URL('../../', import.meta.url));

interface Step {
  readonly id: string;
  readonly description: string;
  readonly media: { readonly svg?: string; readonly markdown?: string; readonly altText?: string };
  readonly completionEvents: readonly string[];
}
const { commands, walkthroughs } = (JSON.parse(readFileSync(join(top, 'package.json'), 'utf8')) as {
  contributes: { commands: { command: string; icon?: string; category?: string }[]; walkthroughs: { steps: Step[] }[] };
}).contributes;
const steps = walkthroughs.flatMap((walkthrough) => walkthrough.steps);

describe('the walkthrough', () => {
  it('names only commands that are there', () => {
    const known = new Set(commands.map(({ command }) => command));
    const named = steps.flatMap(({ description, completionEvents }) => [
      ...[...description.matchAll(/\(command:([\w.]+)/g)].map(([, command]) => command),
      ...completionEvents.map((event) => event.replace('onCommand:', '')),
    ]);
    assert.ok(named.length >= steps.length);
    assert.deepEqual(named.filter((command) => !known.has(command) && !command.startsWith('workbench.')), []);
  });

  for (const { id, media } of steps) {
    it(`has the picture or text of the step «${id}»`, () => {
      const path = media.svg ?? media.markdown ?? '';
      assert.ok(existsSync(join(top, path)), path);
      if (media.svg === undefined) return;
      assert.ok((media.altText ?? '').length > 20, 'it is told to who does not see it');
      const svg = readFileSync(join(top, path), 'utf8');
      assert.equal(XMLValidator.validate(svg), true);
      // The editor's page refuses both; colours come from the theme.
      assert.doesNotMatch(svg, /\sstyle=|<script/);
      assert.match(svg, /var\(--vscode-/);
    });
  }

  it('has no picture that no step shows', () => {
    assert.deepEqual(readdirSync(join(top, 'media/walkthrough')).sort(), steps.map(({ media }) => (media.svg ?? media.markdown)?.replace('media/walkthrough/', '')).sort());
  });
});

describe('the list of the samples', () => {
  it('is what lies in their folder', () => {
    const there = (readdirSync(join(top, 'media/samples'), { recursive: true }) as string[])
      .filter((name) => statSync(join(top, 'media/samples', name)).isFile())
      .map((name) => name.split('\\').join('/'));
    assert.deepEqual([...SAMPLE_FILES].sort(), there.sort());
    assert.ok(SAMPLE_FILES.includes(FIRST_SAMPLE));
  });
});

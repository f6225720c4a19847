import assert from 'node:assert/strict';
import { buildModel } from '../../src/description/buildModel';
import { namesIn } from '../../src/description/names';
import { readDescription } from '../../src/description/readDescription';
import { tidy } from '../../src/description/tidy';
import { diagnosticsAtMost } from '../../src/description/limits';
import { seedFiles, seeds } from './descriptionSeeds';
import { dice, mutateText } from './mutateText';

const long = process.env.OHMWARD_LONG === '1';
const runs = long ? 100_000 : 2_000;
/** One reading of these texts takes a few ms; this is far beyond what any pause of the machine explains. */
const millisecondsAtMost = 5_000;

/** Everything that happens to a text while one types; returns what is wrong with the outcome, or null. */
function faultOf(text: string): string | null {
  const description = readDescription(text, { expressions: true });
  const { diagnostics, problem } = buildModel(description, seedFiles);
  if (diagnostics.length > diagnosticsAtMost) return `${diagnostics.length} diagnostics`;
  for (const { span, message, code, fixes } of diagnostics) {
    const edits = (fixes ?? []).flatMap((fix) => fix.edits);
    for (const each of [span, ...edits.map((edit) => edit.span)]) {
      if (!(each.start >= 0 && each.start <= each.end && each.end <= text.length)) return `${code} at ${each.start} to ${each.end} of ${text.length}: ${message}`;
    }
    // Names of the text itself, which the changes put such words into, are told as they are.
    const own = ['undefined', 'NaN', '[object'].filter((word) => !text.includes(word));
    const told = message.replace(/«[^»]*»/g, '');
    if (own.some((word) => told.includes(word)) || message === '') return `${code}: ${message}`;
  }
  for (const { definition, references } of namesIn(description.syntax)) {
    for (const span of [...references, ...(definition ? [definition] : [])]) if (span.end > text.length) return 'a name outside the text';
  }
  for (const { frequencyHz, name } of problem?.bands ?? []) {
    if (!frequencyHz.every((hz, i) => Number.isFinite(hz) && hz > 0 && (i === 0 || hz > frequencyHz[i - 1]))) return `band ${name}: ${frequencyHz.slice(0, 5).join()}`;
  }
  const { text: laid } = tidy(text);
  if (tidy(laid).text !== laid) return 'tidy twice differs from tidy once';
  return null;
}

describe('descriptions with random changes', function () {
  this.timeout(long ? 3_600_000 : 240_000);

  it(`are read without an exception, ${runs} of them`, () => {
    for (let seed = 1; seed <= runs; seed++) {
      const roll = dice(seed);
      const text = mutateText(seeds[roll(seeds.length)], roll);
      const start = performance.now();
      let fault: string | null;
      try {
        fault = faultOf(text);
      } catch (error) {
        assert.fail(`seed ${seed}: ${error instanceof Error ? error.stack : String(error)}\n${text}`);
      }
      assert.equal(fault, null, `seed ${seed}: ${fault}\n${text}`);
      const took = performance.now() - start;
      assert.ok(took < millisecondsAtMost, `seed ${seed} took ${took.toFixed(0)} ms\n${text}`);
    }
  });

  it('come from descriptions that are right', () => {
    for (const text of seeds) assert.deepEqual(buildModel(readDescription(text, { expressions: true }), seedFiles).diagnostics.map(({ message }) => message), []);
  });
});

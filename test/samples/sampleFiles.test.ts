import assert from 'node:assert/strict';
import { readFileSync, writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { sampleFiles } from './sampleFiles';

const samples = fileURLToPath(new URL('../../media/samples/', import.meta.url));
const rewrite = process.env.UPDATE_EXPECTED === '1' && !process.env.CI;

describe('sample workspace: measured files', () => {
  for (const [path, text] of sampleFiles()) {
    it(`${path} is what its model gives`, () => {
      if (rewrite) writeFileSync(samples + path, text);
      assert.equal(readFileSync(samples + path, 'utf8'), text);
    });
  }
});

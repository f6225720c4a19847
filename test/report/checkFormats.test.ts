import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { Ajv } from 'ajv';
import { XMLParser, XMLValidator } from 'fast-xml-parser';
import { assess } from '../../src/assistance/assess';
import { checkJunit } from '../../src/report/checkJunit';
import { checkSarif } from '../../src/report/checkSarif';

const head = 'ohmward: 1\nload: 12 Ω + 3.3 pF\nbands:\n  main: 862 .. 871 MHz\nladder:\n';
const file = (path: string, text: string) => ({ path, assessment: assess(text, new Map(), { expressions: true }) });

// Invented descriptions: one that holds, one that misses a goal, one with mistakes, one that is unsolved.
const files = [
  file('boards/good.match.yaml', `${head}  - series L1: 10 nH\ngoals:\n  - return loss >= 1 dB\n`),
  file('boards/ü & <b> "c".match.yaml', `${head}  - series L1: 10 nH\ngoals:\n  - return loss >= 30 dB in main\n  - gain >= -40 dB\n`),
  file('bad.match.yaml', `${head}  - series L1: 10 nF\n  - shunt C1: 4.7 H\nlode: 3\ngoals:\n  - return loss >= 3\n`),
  file('open.match.yaml', `${head}  - series L1: solve\ngoals:\n  - return loss >= 3 dB\n`),
];

describe('check for other tools', () => {
  // The schema as OASIS publishes it: docs.oasis-open.org, sarif-schema-2.1.0.json; here from a package of schemas.
  const schema = JSON.parse(readFileSync(createRequire(import.meta.url).resolve('schemastore/schemas/json/sarif-2.1.0.json'), 'utf8')) as object;
  // One pattern of it (a language tag) is none under the rules of unicode expressions.
  const valid = new Ajv({ strict: false, validateFormats: false, unicodeRegExp: false }).compile(schema);

  it('is SARIF that the published schema takes', () => {
    const sarif = checkSarif(files, '1.2.3');
    assert.ok(valid(sarif), JSON.stringify(valid.errors));
    assert.ok(valid(checkSarif([], '1.2.3')));
    assert.equal(valid({ ...sarif, version: '2.0.0' }), false, 'the check can fail');
  });

  it('has a SARIF result for each remark, at its place, and an error for each reason to fail', () => {
    const { runs: [{ results, tool: { driver } }] } = checkSarif(files, '1.2.3') as { runs: { results: { ruleId: string; ruleIndex: number; level: string; locations: { physicalLocation: { artifactLocation: { uri: string }; region: { startLine: number; startColumn: number } } }[] }[]; tool: { driver: { rules: { id: string }[] } } }[] };
    assert.equal(results.length, files.reduce((sum, { assessment }) => sum + assessment.diagnostics.length, 0));
    for (const { ruleId, ruleIndex } of results) assert.equal(driver.rules[ruleIndex].id, ruleId);
    const missed = results.find(({ ruleId }) => ruleId === 'goal-missed');
    assert.equal(missed?.level, 'error');
    assert.equal(missed?.locations[0].physicalLocation.artifactLocation.uri, 'boards/%C3%BC%20%26%20%3Cb%3E%20%22c%22.match.yaml');
    assert.deepEqual([missed?.locations[0].physicalLocation.region.startLine, missed?.locations[0].physicalLocation.region.startColumn], [8, 5]);
    assert.equal(results.find(({ ruleId }) => ruleId === 'unsolved')?.level, 'error');
  });

  it('is well-formed JUnit XML: a suite a description, a case a goal', () => {
    const xml = checkJunit(files);
    assert.equal(XMLValidator.validate(xml), true);
    const parsed = new XMLParser({ ignoreAttributes: false, attributeNamePrefix: '', isArray: (name) => name === 'testcase' }).parse(xml) as
      { testsuites: { tests: string; failures: string; errors: string; testsuite: { name: string; failures: string; errors: string; testcase: { name: string; failure?: { message: string }; error?: { message: string } }[] }[] } };
    const { testsuites: { testsuite: suites, failures, errors } } = parsed;
    assert.deepEqual(suites.map(({ name }) => name), files.map(({ path }) => path));
    assert.deepEqual(suites[1].testcase.map(({ name, failure }) => [name, failure !== undefined]), [['the description', false], ['return loss ≥ 30 dB, main', true], ['gain ≥ −40 dB', false]]);
    assert.match(suites[1].testcase[1].failure?.message ?? '', /dB short$/);
    assert.equal(suites[0].failures, '0');
    assert.match(suites[2].testcase[0].error?.message ?? '', /^line \d+: /);
    assert.match(suites[3].testcase[0].error?.message ?? '', /has no value yet/);
    assert.ok(Number(failures) >= 1 && Number(errors) === 2);
  });

  it('survives characters that XML has no place for', () => {
    assert.equal(XMLValidator.validate(checkJunit([file('a\u0001b.match.yaml', `${head}  - series L\u0000: 1 nH\n`)])), true);
  });
});

import assert from 'node:assert/strict';
import { readDescription } from '../../src/description/readDescription';
import { firmwareDiagnostics, mendedByWriting, type FirmwareFile } from '../../src/report/firmwareDiagnostics';

const text = 'ohmward: 1\nfirmware:\n  header: src/codes.h\n  json: codes.json\n  symbol: codes\n';
const { syntax } = readDescription(text, { expressions: true });
const file = (more: Partial<FirmwareFile>): FirmwareFile => ({ path: 'src/codes.h', text: 'a table', state: 'current', reason: '', ...more });
const told = (more: Partial<FirmwareFile>) => firmwareDiagnostics(syntax, [file(more)]).map(({ code, severity, span, message }) => ({ code, severity, message, marked: text.slice(span.start, span.end) }));

describe('what is said of a firmware table', () => {
  it('is nothing while it is up to date', () => assert.deepEqual(told({}), []));

  for (const [state, code, mended] of [['missing', 'firmware-missing', true], ['out of date', 'firmware-out-of-date', true], ['foreign', 'firmware-foreign', false]] as const) {
    it(`stands on its path where it is ${state}`, () => {
      const [{ message, ...rest }] = told({ state });
      assert.deepEqual(rest, { code, severity: 'warning', marked: 'src/codes.h' });
      assert.match(message, /src\/codes\.h/);
      assert.equal(mendedByWriting.has(code), mended);
    });
  }

  it('is why there is nothing to write, or nothing to compare with', () => {
    assert.match(told({ text: null, state: 'missing', reason: 'an invented reason' })[0].message, /an invented reason/);
    assert.equal(told({ text: null, state: 'foreign', reason: 'an invented reason' })[0].code, 'firmware-foreign');
    assert.deepEqual(told({ state: 'unreadable', reason: 'an invented reason' }).map(({ code, severity }) => [code, severity]), [['firmware-not-read', 'info']]);
  });

  it('stands on the path that is meant, of several', () => {
    const [{ span }] = firmwareDiagnostics(syntax, [file({ path: 'codes.json', state: 'missing' })]);
    assert.equal(text.slice(span.start, span.end), 'codes.json');
    assert.deepEqual(firmwareDiagnostics(syntax, [file({ path: 'other.h', state: 'missing' })]), []);
  });
});

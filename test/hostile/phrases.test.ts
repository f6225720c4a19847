import assert from 'node:assert/strict';
import { readBandPhrase } from '../../src/description/phrase/readBand';
import { readElementPhrase } from '../../src/description/phrase/readElementPhrase';
import { readFamilyPhrase } from '../../src/description/phrase/readFamily';
import { readGoalPhrase } from '../../src/description/phrase/readGoal';
import { readImpedancePhrase } from '../../src/description/phrase/readImpedance';
import { readLadderSolvePhrase } from '../../src/description/phrase/readLadderSolve';
import { readLetPhrase } from '../../src/description/phrase/readLet';
import { readMeasuredPhrase } from '../../src/description/phrase/readMeasured';
import { readSourcePhrase } from '../../src/description/phrase/readSource';
import { readTunablePhrase } from '../../src/description/phrase/readTunable';
import { assertPlaces, nameOf, readPhrase, type Reader } from '../description/phrase/support';
import { dice } from './mutateText';

const runs = process.env.OHMWARD_LONG === '1' ? 100_000 : 2_000;
const millisecondsAtMost = 2_000;

const words = [
  '4.7', '4n7', 'R47', '1e3', '1e999', '.5', '5.', '-', '−', '+', '+ ', '±', '+/-', '5 %', 'nH', 'pF', 'Ω', '\u2126', 'ohm', 'MHz', 'mHz', 'KHz', 'dB', 'dBm', 'dB/m', '°', 'λ', 'mm', 'in', 'mil', 'V', 'mA', ' .. ', '..', '…', ', ', ',', '||', '(', ')', '[', ']', '@', ' at ', ' in ', ' for ', ' into ', ' from ', ' against ', ' with ',
  ' or none', ' x ', '×', 'solve ', 'up to', 'pi', 'tee', 'pair ', 'not fitted', 'coil ', 'turns', 'diameter', 'wire', 'tunable ', 'Q ', 'ESR ', 'ESL ', 'SRF ', 'rated ', 'fixed', 'part ', 'vf ', 'microstrip ', 'width ', 'permittivity ', 'gamma ', 'open', 'short', 'j37', '37j', 'a.s1p', ' differential', ' port 2', 'wants ', 'E24', 'coils', 'capacitor ', 'bits ',
  'step ', '31 points', 'watch', '>=', '<', '≥', 'return loss', 'VSWR', 'S11', 'yield', 'voltage ', 'C1', '=', '=(', 'f0', 'sqrt(', '^', '*', '/', '\u00a0', '\t', '𝕏', '\ud800', '', '0', '00', '99999999999999999999', '#', ':', "'", '"', '{', '}', '\\', '__proto__', 'constructor', '   ',
];

const readers: readonly Reader<unknown>[] = [
  (phrase, context) => readElementPhrase('series', 'L1', phrase, context), (phrase, context) => readElementPhrase('shunt', 'X1', phrase, context), (phrase, context) => readElementPhrase('line', 'F1', phrase, context),
  (phrase, context) => readElementPhrase('transformer', 'T1', phrase, context), (phrase, context) => readElementPhrase('block', 'B1', phrase, context), (phrase, context) => readBandPhrase(nameOf('b'), phrase, context),
  (phrase, context) => readFamilyPhrase(nameOf('f'), phrase, context), (phrase, context) => readTunablePhrase(nameOf('t'), phrase, context), (phrase, context) => readImpedancePhrase(phrase, context, null), readGoalPhrase, readLadderSolvePhrase,
  (phrase, context) => readLetPhrase(nameOf('k'), phrase, context), (phrase, context) => readMeasuredPhrase(null, phrase, context), readSourcePhrase,
];

describe('phrases put together at random', function () {
  this.timeout(3_600_000);

  it(`are read without an exception, ${runs} of them by every reader`, () => {
    for (let seed = 1; seed <= runs; seed++) {
      const roll = dice(seed);
      const text = Array.from({ length: 1 + roll(10) }, () => words[roll(words.length)] + (roll(2) === 0 ? ' ' : '')).join('');
      const start = performance.now();
      for (const [i, reader] of readers.entries()) {
        try {
          const { value, diagnostics } = readPhrase(reader, text);
          assertPlaces(text, diagnostics);
          assert.ok(diagnostics.every(({ message }) => !/undefined|NaN|\[object/.test(message.replace(/«[^»]*»/g, ''))), diagnostics.map(({ message }) => message).join(' '));
          JSON.stringify(value, (_, entry: unknown) => {
            if (typeof entry === 'number') assert.ok(Number.isFinite(entry), 'a number that is not finite');
            return entry;
          });
        } catch (error) {
          assert.fail(`seed ${seed}, reader ${i}, «${text}»: ${error instanceof Error ? error.stack : String(error)}`);
        }
      }
      assert.ok(performance.now() - start < millisecondsAtMost, `seed ${seed} took ${(performance.now() - start).toFixed(0)} ms: «${text}»`);
    }
  });

  it('may be very long', () => {
    for (const piece of ['(', '1 nH + ', '1 nH || ', '1', '=(', '+', ' ', '1 ..', ',', 'a ', 'or none ', '[1,', '1e', '5 % ', '+1 % ', 'Q 1 ', 'at ', '.s1p ']) {
      const text = piece.repeat(Math.ceil(20_000 / piece.length));
      for (const [i, reader] of readers.entries()) {
        const start = performance.now();
        assertPlaces(text, readPhrase(reader, text).diagnostics);
        const took = performance.now() - start;
        assert.ok(took < millisecondsAtMost, `reader ${i} took ${took.toFixed(0)} ms over «${piece}»`);
      }
    }
  });
});

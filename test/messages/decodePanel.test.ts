import assert from 'node:assert/strict';
import fc from 'fast-check';
import { decodeToHost, decodeToPage } from '../../src/messages/decodePanel';
import { listOf, number, oneOf, orNull, shape, text, whole } from '../../src/messages/decode';
import type { PanelView, ToHost, ToPage } from '../../src/messages/panel';

const view: PanelView = {
  title: 'Orchard frost sensor', fileName: 'frost.match.yaml', pinned: false, verdict: '3 of 4 goals hold',
  goals: [{ id: 0, title: 'return loss ≥ 12 dB', place: 'uplink', ok: true, known: true, valueText: '20.7 dB', detail: 'worst: wet bark, 868.2 MHz', marginText: '8.7 dB to spare', note: '', bar: 0.4, line: 12 }],
  problems: [{ severity: 'warning', message: 'an invented problem', line: 3 }], cautions: ['an invented caution'], z0Ohm: 50, frequencyHz: [863e6, 870e6], bands: [{ name: 'uplink', startHz: 863e6, stopHz: 870e6, watch: false }],
  traces: [{ caseName: 'load', reflection: { re: [0.1, null], im: [0.2, null] }, reflectionDb: [-13, null], gainDb: [-0.2, null], reason: null }],
  discs: [{ centreRe: 0, centreIm: 0, radius: 0.25, label: '12 dB' }], limits: [{ centreRe: 0, centreIm: 0, radius: 0.1, label: 'Bode–Fano' }], masks: [{ plot: 'reflection', side: 'at most', levelDb: -12, startHz: 863e6, stopHz: 870e6, ok: true, goalId: 0 }],
  marker: { frequencyHz: 866.5e6, text: '866.5 MHz', cases: [{ caseName: 'load', text: 'Γ 0.1', loadReflection: { re: 0.1, im: 0 }, steps: [{ name: 'L1', arc: { re: [0.1], im: [0.2] } }], inputReflection: null }] },
  ladder: [{ id: 'L1', name: 'L1', orientation: 'series', symbol: 'inductor', value: '13 nH', reactance: '+j70.8 Ω', impedanceAfter: '18.0 + j2.0 Ω', voltage: '1 V', current: '20 mA', heat: '1 mW', loss: '4 %', sensitivity: '0.1', note: '', line: 20, editable: true }],
  notInserted: true,
  spread: { stale: false, share: 1, yieldText: '97 %', goalsText: 'by goal', cornerText: 'worst corner', remedyText: '', cornerDb: -1, bars: [{ fromDb: 0, toDb: 1, count: 3 }], cloud: [{ re: [0.1, null], im: [0.2, null] }] },
  candidates: { stale: false, message: '', notes: ['an invented remark'], outOfReach: [{ form: 'series L, shunt C', text: 'out of reach', reach: { text: 'loads', across: 2, marginDb: [null, 1, -2, null], cases: [] } }], candidates: [{ id: 0, values: 'L1 13 nH', holds: true, margin: '1 dB', returnLoss: '15 dB', gain: '−0.5 dB', parts: '1', response: 'low-pass', directCurrent: 'passes', proof: 'proved', note: '' }] },
  codes: {
    summary: 'every goal holds', tunables: [{ name: 'bank', low: 0, high: 3 }], channels: [{ frequencyHz: 866e6, text: '866 MHz', codes: [2], margin: '1 dB', marginDb: 1, holds: true, returnLoss: '14 dB', gain: '−0.5 dB' }], shown: 0,
    stepsText: 'one code off', proof: 'proved', firmware: [{ path: 'codes.h', text: 'out of date', ok: false, writable: true }], coverageText: '',
    coverage: { text: 'covered', across: 2, marginDb: [null, 1, -2, null], cases: [{ caseName: 'load', text: 'covered', holds: true, reflection: { re: 0.1, im: 0 } }] },
  },
};

const toPage: readonly ToPage[] = [
  { type: 'view', document: 'file:///a', version: 4, view }, { type: 'stale', document: 'file:///a', version: 4, reason: null, problems: view.problems }, { type: 'marker', document: 'file:///a', version: 4, request: 2, marker: view.marker, refusal: null },
  { type: 'preview', document: 'file:///a', version: 4, request: 3, traces: view.traces }, { type: 'preview', document: 'file:///a', version: 4, request: 3, traces: null },
  { type: 'marker', document: 'file:///a', version: 4, request: 2, marker: null, refusal: 'not a frequency' }, { type: 'solving', document: 'file:///a', version: 4, share: 0.42, text: '42 %' }, { type: 'cursor', document: 'file:///a', version: 4, elementId: 'L1', goalId: null }, { type: 'nothing', document: '', version: 0, message: 'no description is open' },
];

const toHost: readonly ToHost[] = [
  { type: 'ready' }, { type: 'move marker', document: 'file:///a', request: 1, frequencyHz: 868e6 }, { type: 'type marker', document: 'file:///a', request: 1, text: '868 MHz' }, { type: 'reveal line', document: 'file:///a', line: 0 }, { type: 'point at element', document: 'file:///a', elementId: null },
  { type: 'step value', document: 'file:///a', version: 3, elementId: 'L1', direction: 'up' }, { type: 'set value', document: 'file:///a', version: 3, elementId: 'L1', text: '12 nH' }, { type: 'copy', document: 'file:///a', what: 'ladder csv', text: 'a,b' }, { type: 'save', document: 'file:///a', what: 'chart png', base64: 'AAAA' },
  { type: 'preview candidate', document: 'file:///a', version: 3, request: 1, candidate: 2 }, { type: 'insert candidate', document: 'file:///a', version: 3, candidate: 0 },
  { type: 'write firmware', document: 'file:///a', version: 3 }, { type: 'save report', document: 'file:///a' }, { type: 'copy', document: 'file:///a', what: 'codes csv', text: 'a,b' },
  { type: 'pin', document: 'file:///a', pinned: true }, { type: 'failure', message: 'an invented failure' },
];

/** Every place of a message, as the keys that lead there. */
function placesOf(value: unknown, path: readonly (string | number)[] = []): (string | number)[][] {
  if (typeof value !== 'object' || value === null) return [[...path]];
  const entries = Array.isArray(value) ? value.map((entry, i) => [i, entry] as const) : Object.entries(value);
  return [...(path.length > 0 ? [[...path]] : []), ...entries.flatMap(([key, entry]) => placesOf(entry, [...path, key]))];
}

function withChange(value: unknown, path: readonly (string | number)[], change: (holder: Record<string | number, unknown>, key: string | number) => void): unknown {
  const copy = structuredClone(value) as Record<string | number, unknown>;
  let holder = copy;
  for (const key of path.slice(0, -1)) holder = holder[key] as Record<string | number, unknown>;
  change(holder, path[path.length - 1]);
  return copy;
}

for (const [side, decode, messages] of [['page', decodeToPage, toPage], ['host', decodeToHost, toHost]] as const) {
  describe(`messages to the ${side}`, () => {
    for (const [i, message] of messages.entries()) {
      it(`${i + 1}: ${message.type} is taken as it is, and across a process`, () => {
        assert.deepEqual(decode(message), message);
        assert.deepEqual(decode(structuredClone(message)), message);
        assert.deepEqual(decode(JSON.parse(JSON.stringify(message))), message);
      });

      it(`${i + 1}: ${message.type} with a field missing, or of another kind anywhere, is dropped`, () => {
        for (const path of placesOf(message)) {
          const wrong = withChange(message, path, (holder, key) => {
            holder[key] = { wrong: true };
          });
          assert.equal(decode(wrong), null, path.join('.'));
          assert.equal(decode(withChange(message, path, (holder, key) => { holder[key] = undefined; })), null, `${path.join('.')} undefined`);
          if (typeof path[path.length - 1] === 'string') assert.equal(decode(withChange(message, path, (holder, key) => { delete holder[key]; })), null, `${path.join('.')} missing`);
        }
      });

      it(`${i + 1}: ${message.type} loses fields that do not belong to it`, () => {
        assert.deepEqual(decode({ ...message, command: 'workbench.action.quit', path: '/etc' }), message);
        assert.equal(Object.getPrototypeOf(decode(message)), Object.prototype);
      });
    }

    it('are dropped where they are no messages', () => {
      for (const data of [null, undefined, 0, 'ready', [], [messages[0]], {}, { type: 'nobody' }, { type: 1 }, { type: 'constructor' }, { type: '__proto__' }, { type: 'toString' }, Object.create(messages[0]) as unknown, () => messages[0], new Map([['type', 'ready']]), NaN]) assert.equal(decode(data), null);
    });

    it('may be anything at all', () => {
      const types = fc.constantFrom(...messages.map(({ type }) => type));
      fc.assert(fc.property(fc.oneof(fc.anything({ withNullPrototype: true, withMap: true, withDate: true, withTypedArray: true }), fc.record({ type: types, document: fc.anything(), version: fc.anything(), request: fc.anything(), text: fc.anything(), line: fc.anything(), view: fc.anything() }, { requiredKeys: ['type'] })), (data) => {
        const decoded = decode(data);
        // What is taken is whole: decoding it again gives the same.
        if (decoded !== null) assert.deepEqual(decode(decoded), decoded);
      }), { numRuns: 1500 });
    });
  });
}

describe('decoders', () => {
  it('of numbers take no NaN, infinity, fractions where whole ones are meant, or negative counts', () => {
    for (const data of [NaN, Infinity, -Infinity, '1', null, 1n]) assert.equal(number(data), undefined);
    for (const data of [-1, 0.5, 2 ** 53, NaN, '1']) assert.equal(whole(data), undefined);
    assert.deepEqual([number(-0.5), whole(7)], [-0.5, 7]);
  });
  it('of lists drop all where one does not fit, and what is too long', () => {
    assert.equal(listOf(number)([1, '2']), undefined);
    assert.equal(listOf(number)({ length: 1, 0: 1 }), undefined);
    assert.equal(listOf(whole)(new Array(200_001).fill(0)), undefined);
    assert.equal(listOf(number)([1, , 2]), undefined);
  });
  it('of texts drop what is too long', () => {
    assert.equal(text('x'.repeat(8_000_001)), undefined);
    assert.equal(text(new String('x')), undefined);
  });
  it('of objects look at own fields only', () => {
    assert.equal(shape<{ a: number }>({ a: number })(Object.create({ a: 1 })), undefined);
    assert.deepEqual(shape<{ a: number | null }>({ a: orNull(number) })({ a: null, b: 2 }), { a: null });
    assert.equal(oneOf('a', 'b')('c'), undefined);
  });
});

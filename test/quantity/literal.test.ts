import assert from 'node:assert/strict';
import fc from 'fast-check';
import { literalAt, literalValue } from '../../src/quantity/literal';
import { dimensionOf, meantUnit, unitOf, unitSpellings, type Dimension } from '../../src/quantity/unit';

const read = (text: string, ...expected: Dimension[]) => {
  const literal = literalAt(text, 0, expected);
  return literal && { form: literal.form, unit: literal.unit, value: literalValue(literal), taken: text.slice(0, literal.end) };
};

describe('numbers with units', () => {
  for (const [text, expected, taken, value, unit] of [
    ['4.7 nH', 'inductance', '4.7 nH', 4.7e-9, 'nH'], ['4.7nH Q 35', 'inductance', '4.7nH', 4.7e-9, 'nH'], ['863 MHz .. 870', 'frequency', '863 MHz', 863e6, 'MHz'], ['−1.5 dB in uplink', 'decibels', '−1.5 dB', -1.5, 'dB'], ['+3 dB', 'decibels', '+3 dB', 3, 'dB'],
    ['0.4 dB/m @ 1 GHz', 'loss per length', '0.4 dB/m', 0.4, 'dB/m'], ['14 dBm', 'power', '14 dBm', 10 ** 1.4 / 1000, 'dBm'], ['5 %', 'percent', '5 %', 0.05, '%'], ['5%', 'percent', '5%', 0.05, '%'], ['90°', 'angle', '90°', 90, '°'], ['0.25 λ', 'wavelengths', '0.25 λ', 0.25, 'λ'],
    ['250 mil', 'length', '250 mil', 0.00635, 'mil'], ['1 in', 'length', '1 in', 0.0254, 'in'], ['35 µm', 'length', '35 µm', 35e-6, 'µm'], ['20 mS', 'conductance', '20 mS', 0.02, 'mS'], ['3 ns', 'time', '3 ns', 3e-9, 'ns'],
  ] as const) it(`«${text}»`, () => assert.deepEqual(read(text, expected), { form: 'unit', unit, value, taken }));

  it('stop before the next word of a phrase', () => {
    for (const [text, expected, taken] of [['2 x uplink', 'number', '2'], ['12 in uplink', 'decibels', '12'], ['5 bits', 'number', '5'], ['6 turns', 'number', '6'], ['401 points', 'number', '401'], ['35 @ 900 MHz', 'number', '35'], ['0.62 at -38°', 'number', '0.62'], ['1 .. 33 nH', 'inductance', '1'], ['863..870MHz', 'frequency', '863'], ['2 elements', 'number', '2'], ['40 ESR 1 Ω', 'number', '40']] as const) {
      assert.deepEqual(read(text, expected)?.form, 'bare', text);
      assert.equal(read(text, expected)?.taken, taken, text);
    }
  });

  it('take codes and bare prefixes only where the kind of the part gives the unit', () => {
    assert.equal(read('4n7', 'inductance')?.form, 'letters');
    assert.equal(read('5.6n', 'capacitance')?.form, 'prefix');
    assert.equal(read('4n7', 'frequency')?.form, 'unit');
    assert.equal(read('1k', 'frequency')?.unit, 'k');
    assert.equal(read('10 p', 'capacitance')?.form, 'unit');
    assert.equal(read('4n7H', 'inductance')?.form === 'letters', false);
  });

  it('are no numbers where none stands', () => {
    for (const text of ['', 'nH', '.', '-', '+', 'e5', '.e5', '= 5', 'x1', '∞']) assert.equal(read(text, 'inductance'), null, text);
  });

  it('are the double nearest to what is written, whatever the prefix', () => {
    const prefixes = [['p', -12], ['n', -9], ['µ', -6], ['μ', -6], ['u', -6], ['m', -3], ['', 0], ['k', 3], ['M', 6], ['G', 9]] as const;
    fc.assert(fc.property(fc.integer({ min: 0, max: 10 ** 9 }), fc.integer({ min: 0, max: 9 }), fc.constantFrom(...prefixes), fc.constantFrom('H', 'F', 'Hz', 'Ω', 'ohm', 'V', 'A', 'W', 'S', 's'), (digits, decimals, [prefix, exponent], unit) => {
      const text = `${digits}e${-decimals} ${prefix}${unit}`;
      assert.equal(read(text, dimensionOf(prefix + unit)!)?.value, Number(`${digits}e${exponent - decimals}`), text);
    }), { numRuns: 500 });
  });
});

describe('units', () => {
  it('have the prefixes of the language and no others', () => {
    for (const unit of ['nH', 'µF', 'fF', 'cm', 'GHz', 'mW', 'kΩ', 'Mohm', 'deg', 'lambda']) assert.ok(unitOf(unit), unit);
    for (const unit of ['fH', 'cH', 'mdB', 'kdBm', 'k%', 'cF', 'THz', 'dam', 'KHz', 'pf', 'Ohm', 'nh', 'm°', 'constructor']) assert.equal(dimensionOf(unit), null, unit);
  });

  it('are recognised in other cases and as words', () => {
    for (const [written, dimension, meant] of [['pf', 'capacitance', 'pF'], ['PF', 'capacitance', 'pF'], ['KHz', 'frequency', 'kHz'], ['MHZ', 'frequency', 'MHz'], ['mhz', 'frequency', 'MHz'], ['ghz', 'frequency', 'GHz'], ['nh', 'inductance', 'nH'], ['ohms', 'resistance', 'Ω'], ['db', 'decibels', 'dB'], ['DBM', 'power', 'dBm'], ['MM', 'length', 'mm'], ['degrees', 'angle', '°']] as const) {
      assert.equal(meantUnit(written, dimension), meant, written);
    }
    assert.equal(meantUnit('parsec', 'length'), null);
  });

  it('are each their own meaning', () => {
    for (const spelling of unitSpellings) assert.ok(dimensionOf(spelling), spelling);
  });
});

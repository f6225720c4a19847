import assert from 'node:assert/strict';
import fc from 'fast-check';
import type { Complex } from '../../src/network/complex';
import { describeForm, twoElementForms, twoElementMatches } from '../../src/solve/closedForms';
import { formReach, inReach } from '../../src/solve/formReach';
import { mismatch } from './mismatch';

// Rows L1 … L17 of the published checks; «from memory» where the book was not seen again.

const ghz = 1e9;
const count = (load: Complex, source: Complex = { re: 50, im: 0 }): number =>
  twoElementMatches(load, source, ghz).forms.reduce((sum, { matches }) => sum + matches.length, 0);

const near = (actual: number, expected: number, digits: number, what = ''): void =>
  assert.ok(Math.abs(actual - expected) <= Math.abs(expected) * 10 ** -digits, `${what} ${actual} is not ${expected}`);

const positive = fc.double({ min: -2.5, max: 2.5, noNaN: true }).map((power) => 50 * 10 ** power);
const reactance = fc.tuple(fc.double({ min: -2, max: 2.5, noNaN: true }), fc.constantFrom(-1, 0, 1)).map(([power, sign]) => sign * 50 * 10 ** power);
const impedance = fc.tuple(positive, reactance).map(([re, im]): Complex => ({ re, im }));

describe('two-element matches in closed form', () => {
  // After Pozar, Microwave Engineering, 4th ed., Example 5.1, from memory (L1), to 7 recomputed digits.
  it('matches 200 − j100 Ω to 100 Ω at 500 MHz in two ways', () => {
    const answer = twoElementMatches({ re: 200, im: -100 }, { re: 100, im: 0 }, 0.5 * ghz);
    const matches = answer.forms.flatMap((form) => form.matches);
    assert.deepEqual(matches.map((match) => describeForm(match.form)), ['shunt L, series C', 'shunt C, series L']);
    const [second, first] = matches;
    near(first.parts[0].value, 0.9227738e-12, 6);
    near(first.parts[1].value, 38.98484e-9, 6);
    near(second.parts[1].value, 2.598989e-12, 6);
    near(second.parts[0].value, 46.13869e-9, 6);
    assert.deepEqual([first.response, first.dcPath, first.dcBlock], ['low-pass', true, false]);
    assert.deepEqual([second.response, second.dcPath, second.dcBlock], ['high-pass', false, true]);
  });

  // L2 after Bowick, ch. 4, L8 after Steer, vol. 3, L10 after Razavi, §2.5.2; all from memory.
  for (const { row, load, source, at, inductance, capacitance } of [
    { row: 'L2', load: 1000, source: 100, at: 0.1 * ghz, inductance: 477.4648e-9, capacitance: 4.774648e-12 },
    { row: 'L8', load: 1700, source: 100, at: 0.9 * ghz, inductance: 70.73553e-9, capacitance: 0.4160914e-12 },
    { row: 'L10', load: 50, source: 25, at: 5 * ghz, inductance: 0.7957747e-9, capacitance: 0.6366198e-12 },
  ]) {
    it(`gives the low-pass parts of row ${row}`, () => {
      const { forms } = twoElementMatches({ re: load, im: 0 }, { re: source, im: 0 }, at);
      const lowPass = forms.flatMap((form) => form.matches).filter((match) => match.response === 'low-pass');
      assert.equal(lowPass.length, 1);
      near(lowPass[0].parts[0].value, capacitance, 6);
      near(lowPass[0].parts[1].value, inductance, 6);
    });
  }

  // L13; the rule after Pozar §5.1, counts derived.
  for (const [load, matches] of [
    [{ re: 30, im: 40 }, 4], [{ re: 10, im: 15 }, 2], [{ re: 200, im: -100 }, 2], [{ re: 60, im: -80 }, 2], [{ re: 25, im: 0 }, 2], [{ re: 100, im: 0 }, 2],
  ] as const) {
    it(`finds ${matches} matches of ${load.re} + j${load.im} Ω to 50 Ω`, () => assert.equal(count(load), matches));
  }

  it('gives one part where one is enough, and none where nothing is needed', () => {
    const resonant = twoElementMatches({ re: 50, im: 80 }, { re: 50, im: 0 }, ghz);
    // 50 + j80 Ω is inside of the circle of 20 mS, so the shunt-first forms have their two matches beside the one part.
    assert.deepEqual(resonant.single.map(({ orientation, kind, reactanceOhm }) => [orientation, kind, reactanceOhm]), [['series', 'capacitor', -80]]);
    assert.equal(resonant.matched, false);
    const shuntOnly = twoElementMatches({ re: 25, im: 25 }, { re: 50, im: 0 }, ghz);
    assert.deepEqual(shuntOnly.single.map(({ orientation, kind }) => [orientation, kind]), [['shunt', 'capacitor']]);
    near(shuntOnly.single[0].reactanceOhm, -50, 12);
    const already = twoElementMatches({ re: 18, im: 37 }, { re: 18, im: -37 }, ghz);
    assert.equal(already.matched, true);
    assert.ok(already.forms.every(({ matches }) => matches.length <= 1));
  });

  it('says why where nothing can match', () => {
    for (const load of [{ re: 0, im: 20 }, { re: -5, im: 0 }, { re: Infinity, im: 0 }]) {
      const { forms } = twoElementMatches(load, { re: 50, im: 0 }, ghz);
      assert.ok(forms.every(({ matches, reason }) => matches.length === 0 && reason !== null && reason.length > 10));
    }
    const { forms } = twoElementMatches({ re: 200, im: 0 }, { re: 50, im: 0 }, ghz);
    assert.match(forms[0].reason ?? '', /200 Ω, is above 50 Ω/);
    assert.match(forms[4].reason ?? '', /takes shunt C, series L or shunt L, series C/);
    assert.equal(forms[5].reason, null);
  });

  it('leaves no part out that a large reactance makes look small', () => {
    const [load, source] = [{ re: 50, im: 10155.422847876665 }, { re: 50.000000000984656, im: 0 }];
    const { forms, single } = twoElementMatches(load, source, ghz);
    for (const part of single) assert.ok(mismatch([part], load, source, ghz) < 1e-9);
    for (const { matches } of forms) for (const { parts } of matches) assert.ok(mismatch(parts, load, source, ghz) < 1e-9);
  });

  it('matches any load to any source to |Γ| < 1e-9, and gives reasons for the other forms', () => {
    fc.assert(fc.property(impedance, impedance, (load, source) => {
      const { forms, single, matched } = twoElementMatches(load, source, ghz);
      let found = matched ? 1 : single.length;
      for (const { matches, reason } of forms) {
        assert.equal(matches.length === 0, reason !== null);
        for (const { parts } of matches) assert.ok(mismatch(parts, load, source, ghz) < 1e-9);
        found += matches.length;
      }
      for (const part of single) assert.ok(mismatch([part], load, source, ghz) < 1e-9);
      // Rs·Gs ≤ 1, so one of both orders always reaches.
      assert.ok(found > 0, 'some form always reaches a match');
    }), { numRuns: process.env.OHMWARD_LONG === '1' ? 300_000 : 3000 });
  });

  it('reaches just what the drawn region says', () => {
    fc.assert(fc.property(impedance, impedance, positive, (load, source, z0Ohm) => {
      const { forms, single, matched } = twoElementMatches(load, source, ghz);
      fc.pre(single.length === 0 && !matched);
      const point = chartPoint(load, z0Ohm);
      for (const { form, matches } of forms) {
        const reach = formReach(form, source, z0Ohm);
        const inside = inReach(reach, point);
        // On the border itself rounding decides.
        if (inside !== matches.length > 0) assert.ok(nearBorder(reach, point), `${describeForm(form)} ${inside}`);
      }
    }), { numRuns: 3000 });
  });

  // L17; regions after Pozar §5.1, areas by hand (discs of radius ½) and counted.
  for (const form of twoElementForms) {
    const share = form.kinds[0] === form.kinds[1] ? 0.25 : 0.5;
    it(`${describeForm(form)} matches ${share} of the chart`, () => {
      const reach = formReach(form, { re: 50, im: 0 }, 50);
      let inside = 0;
      let all = 0;
      for (let i = 0; i < 200; i++) {
        for (let j = 0; j < 200; j++) {
          const point = { re: (i + 0.5) / 100 - 1, im: (j + 0.5) / 100 - 1 };
          if (Math.hypot(point.re, point.im) > 1) continue;
          all++;
          if (inReach(reach, point)) inside++;
        }
      }
      // Cells cut by a border: about 200 of 31 400, half of them wrong at the very worst.
      assert.ok(Math.abs(inside / all - share) < 0.003, String(inside / all));
    });
  }
});

const chartPoint = (z: Complex, z0: number): Complex => {
  const size = (z.re + z0) ** 2 + z.im ** 2;
  return { re: (z.re * z.re + z.im * z.im - z0 * z0) / size, im: (2 * z.im * z0) / size };
};

function nearBorder(reach: ReturnType<typeof formReach>, { re, im }: Complex): boolean {
  return reach.some((piece) => piece.some((region) => region.form === 'half-plane'
    ? Math.abs(re * region.normal.re + im * region.normal.im - region.offset) < 1e-9
    : Math.abs(Math.hypot(re - region.centre.re, im - region.centre.im) - region.radius) < 1e-9));
}

import assert from 'node:assert/strict';
import { removeFixture, throughElements } from '../../src/network/cascade';
import { impedanceOf, reflectionOf } from '../../src/network/immittance';
import type { Element } from '../../src/network/element';
import { capacitor, hz, lineOf, near, nearComplex, ohm, pointOf, sampled, series, shunt, stub, through } from './expect';

const F = 1e9;

describe('removing a fixture', () => {
  it('turns a line back, counter-clockwise', () => {
    // Row V3 of the project's elementary cases: 20 mm of 50 Ω, velocity factor 0.7, 30 + j20 Ω measured at 1 GHz.
    const line: Element = { form: 'line', name: 'F1', line: { impedanceOhm: 50, lengthM: 0.02, velocityFactor: 0.7, conductorLossDb: 0, dielectricLossDb: 0, lossAtHz: 1 } };
    const load = removeFixture(sampled(ohm(30, 20), F), [line], hz(F));
    nearComplex(pointOf(impedanceOf(load)), { re: 24.59083, im: -3.182643 }, 1e-5);
    const before = pointOf(reflectionOf(sampled(ohm(30, 20), F), 50));
    const after = pointOf(reflectionOf(load, 50));
    const turned = ((Math.atan2(after.im, after.re) - Math.atan2(before.im, before.re)) * 180) / Math.PI;
    near((turned + 360) % 360, 68.6189, 1e-4);
  });

  it('gives loss back twice its decibels, also past |Γ| = 1', () => {
    const lossy = through(lineOf(50, 40, F, 1));
    const magnitudeAfter = (re: number) => {
      const { re: x, im: y } = pointOf(reflectionOf(removeFixture(sampled(ohm(re), F), [lossy], hz(F)), 50));
      return Math.hypot(x, y);
    };
    near(magnitudeAfter(150), 0.5 * 10 ** (2 / 20), 1e-12);
    near(magnitudeAfter(1e9), 10 ** (2 / 20), 1e-6);
    assert.ok(magnitudeAfter(1e9) > 1);
  });

  it('undoes the outermost element first', () => {
    const fixture = [series(ohm(3, 20)), shunt(capacitor(2e-12)), through(lineOf(75, 33, F, 0.5)), stub('open', lineOf(50, 20, F))];
    for (const load of [ohm(18, -37), ohm(0), ohm(400, 200)]) {
      const measured = throughElements(fixture, sampled(load, F), hz(F));
      nearComplex(pointOf(reflectionOf(removeFixture(measured, fixture, hz(F)), 50)), pointOf(reflectionOf(sampled(load, F), 50)), 1e-12);
    }
  });

  it('leaves what was measured alone without a fixture', () => {
    const measured = sampled(ohm(18, -37), F);
    assert.equal(removeFixture(measured, [], hz(F)), measured);
  });

  it('cannot see past what lets nothing through', () => {
    const wall: Element = { form: 'block', name: 'F2', reversed: false, data: { ports: 2, frequencyHz: hz(F), referenceOhm: hz(50, 50), sRe: hz(0.5, 0, 0, 0.2), sIm: hz(0, 0, 0, 0) } };
    for (const [element, reason] of [[series({ form: 'open' }), /nothing through/], [shunt({ form: 'short' }), /nothing through/], [wall, /F2 of the fixture lets nothing through/]] as const) {
      const load = removeFixture(sampled(ohm(50), F), [element], hz(F));
      assert.deepEqual([...load.known], [0]);
      assert.match(load.reason ?? '', reason);
      assert.ok(Number.isNaN(impedanceOf(load).re[0]));
    }
  });

  it('is not known where its own data end', () => {
    const block: Element = { form: 'block', name: 'F3', reversed: false, data: { ports: 2, frequencyHz: hz(F, 2 * F), referenceOhm: hz(50, 50), sRe: hz(0, 1, 1, 0, 0, 1, 1, 0), sIm: hz(0, 0, 0, 0, 0, 0, 0, 0) } };
    const load = removeFixture(sampled(ohm(50), F, 3 * F), [block], hz(F, 3 * F));
    assert.deepEqual([...load.known], [1, 0]);
    assert.ok(load.reason !== null);
  });
});

import assert from 'node:assert/strict';
import { add, complex, divide, subtract, type Complex } from '../../src/network/complex';
import { fileReflection } from '../../src/network/fileReflection';
import { impedanceOf, sampleImpedance } from '../../src/network/immittance';
import { hz, nearComplex, pointOf } from './expect';
import { networkData } from './inventedNetwork';

const reflectionOf = (z: Complex, reference: number): Complex => divide(subtract(z, complex(reference)), add(z, complex(reference)));
/** S of an impedance from port 1 to port 2 that touches nothing else, between two references. */
function floating(z: Complex, r1: number, r2: number): Complex[] {
  const sum = add(z, complex(r1 + r2));
  const across = divide(complex(2 * Math.sqrt(r1 * r2)), sum);
  return [divide(add(z, complex(r2 - r1)), sum), across, across, divide(add(z, complex(r1 - r2)), sum)];
}

describe('what a file shows', () => {
  const three = networkData(3, [1e9, 2e9], (f) => Array.from({ length: 9 }, (_, i) => complex(i / 10, f / 1e10)), [50, 75, 25]);

  it('at a port: its own reflection, against its own reference', () => {
    for (const port of [1, 2, 3]) {
      const { reflection, referenceOhm, known, reason } = fileReflection(three, port, hz(1e9, 1.5e9));
      assert.deepEqual([referenceOhm, [...known], reason], [[50, 75, 25][port - 1], [1, 1], null]);
      nearComplex(pointOf(reflection, 1), complex((4 * (port - 1)) / 10, 0.15), 1e-15);
    }
  });

  it('driven differentially: an impedance between two ports shows itself', () => {
    for (const z of [complex(30, -40), complex(200, 10)]) {
      const data = networkData(2, [1e9], () => floating(z, 50, 50));
      const { reflection, referenceOhm } = fileReflection(data, 'differential', hz(1e9));
      assert.equal(referenceOhm, 100);
      nearComplex(pointOf(reflection), reflectionOf(z, 100), 1e-15);
      nearComplex(pointOf(impedanceOf(sampleImpedance({ form: 'file', data, port: 'differential' }, hz(1e9)))), z, 1e-11);
    }
  });

  it('driven differentially with two references: the same', () => {
    const z = complex(30, -40);
    const { reflection, referenceOhm, known } = fileReflection(networkData(2, [1e9], () => floating(z, 50, 75), [50, 75]), 'differential', hz(1e9));
    assert.deepEqual([referenceOhm, known[0]], [100, 1]);
    nearComplex(pointOf(reflection), reflectionOf(z, 100), 1e-14);
  });

  it('two separate loads in antiphase are in series', () => {
    const data = networkData(2, [1e9], () => [reflectionOf(complex(40), 50), complex(0), complex(0), reflectionOf(complex(40), 50)]);
    nearComplex(pointOf(fileReflection(data, 'differential', hz(1e9)).reflection), reflectionOf(complex(80), 100), 1e-15);
  });

  it('is not known where there is no such port, and outside of the file', () => {
    const cases: [ReturnType<typeof networkData>, number | 'differential', number, RegExp][] = [
      [three, 4, 1e9, /3 ports, and no port 4/], [three, 0, 1e9, /no port 0/], [three, 1.5, 1e9, /no port 1.5/], [three, 1, 3e9, /covers 1 GHz to 2 GHz/], [three, 'differential', 3e9, /covers 1 GHz to 2 GHz/],
      [networkData(1, [1e9], () => [complex(0)]), 2, 1e9, /one port, and no port 2/], [networkData(1, [1e9], () => [complex(0)]), 'differential', 1e9, /two are driven/],
    ];
    for (const [data, port, f, message] of cases) {
      const { reflection, known, reason } = fileReflection(data, port, hz(f));
      assert.deepEqual([known[0], Number.isNaN(reflection.re[0]), Number.isNaN(reflection.im[0])], [0, true, true]);
      assert.match(reason!, message);
    }
  });
});

import assert from 'node:assert/strict';
import fc from 'fast-check';
import { fitsPattern, isInside, pathSegments, resolveReference } from '../../src/platform/pathRules';

const folder = pathSegments('/home/ada/boards/orchard');
const root = pathSegments('/home/ada/boards');

describe('paths that a description names', () => {
  const cases: [reference: string, resolved: string | null, inside: boolean][] = [
    ['frost.s1p', '/home/ada/boards/orchard/frost.s1p', true],
    ['./frost.s1p', '/home/ada/boards/orchard/frost.s1p', true],
    ['vendor/a b.s2p', '/home/ada/boards/orchard/vendor/a b.s2p', true],
    ['../loop/x.s1p', '/home/ada/boards/loop/x.s1p', true],
    ['..', '/home/ada/boards', true],
    ['../../boards-old/x.s1p', '/home/ada/boards-old/x.s1p', false],
    ['../../boards/x.s1p', '/home/ada/boards/x.s1p', true],
    ['vendor/../../../x.s1p', '/home/ada/x.s1p', false],
    ['vendor//..//x.s1p', '/home/ada/boards/orchard/x.s1p', true],
    ['/etc/passwd', '/etc/passwd', false],
    ['/home/ada/boards/x.s1p', '/home/ada/boards/x.s1p', true],
    ['..\\..\\..\\x.s1p', '/home/x.s1p', false],
    ['vendor\\..\\..\\..\\x.s1p', '/home/ada/x.s1p', false],
    ['C:\\secret.s1p', '/C:/secret.s1p', false],
    ['c:/home/ada/boards/x.s1p', '/c:/home/ada/boards/x.s1p', false],
    ['//server/share/x.s1p', '/server/share/x.s1p', false],
    ['.../x.s1p', '/home/ada/boards/orchard/.../x.s1p', true],
    ['../../../../../x.s1p', null, false],
    ['a\0.s1p', null, false],
  ];
  for (const [reference, resolved, inside] of cases) {
    it(`${JSON.stringify(reference)} is ${inside ? 'inside' : 'outside'}`, () => {
      const found = resolveReference(folder, reference);
      assert.equal(found && `/${found.join('/')}`, resolved);
      assert.equal(found !== null && isInside(root, found), inside);
    });
  }

  it('holds no dots and no separators afterwards, whatever was written', () => {
    const piece = fc.constantFrom('..', '.', '', 'a', 'boards', 'b.s1p', '\\', '/', '..\\', 'C:');
    fc.assert(
      fc.property(fc.array(piece, { maxLength: 12 }).map((pieces) => pieces.join('/')), (reference) => {
        const found = resolveReference(folder, reference);
        return found === null || found.every((segment) => segment !== '' && segment !== '.' && segment !== '..' && !/[\\/\0]/.test(segment));
      }),
      { numRuns: 500 },
    );
  });
});

describe('patterns of file names', () => {
  const cases: [pattern: string, name: string, fits: boolean][] = [
    ['*.s2p', 'coil.s2p', true],
    ['*.s2p', '.s2p', true],
    ['*.s2p', 'coil.s2p.bak', false],
    ['coil-?.s2p', 'coil-3.s2p', true],
    ['coil-?.s2p', 'coil-33.s2p', false],
    ['c*-*0*.s2p', 'coil-5-10-a.s2p', true],
    ['a.s2p', 'abs2p', false],
    ['[a].s2p', '[a].s2p', true],
    ['*', '', true],
    ['', 'a', false],
  ];
  for (const [pattern, name, fits] of cases) {
    it(`${JSON.stringify(pattern)} ${fits ? 'fits' : 'does not fit'} ${JSON.stringify(name)}`, () => assert.equal(fitsPattern(pattern, name), fits));
  }

  it('does not blow up on many stars', () => {
    assert.equal(fitsPattern('*a'.repeat(60) + 'b', 'a'.repeat(5_000)), false);
  });
});

import assert from 'node:assert/strict';
import { nameAt, namesIn } from '../../src/description/names';
import { seeds } from '../hostile/descriptionSeeds';
import { read } from './support';

describe('names of a description', () => {
  const text = seeds[0];
  const names = namesIn(read(text).syntax);
  const words = (kind: string, name: string) => {
    const found = names.find((each) => each.kind === kind && each.name === name);
    return found && { definition: found.definition && text.slice(found.definition.start, found.definition.end), uses: found.references.length };
  };

  it('have their definition and their uses', () => {
    assert.deepEqual(words('band', 'uplink'), { definition: 'uplink', uses: 3 });
    assert.deepEqual(words('band', 'rx2'), { definition: 'rx2', uses: 0 });
    assert.deepEqual(words('case', 'free air'), { definition: 'free air', uses: 1 });
    assert.deepEqual(words('family', 'caps'), { definition: 'caps', uses: 2 });
    assert.deepEqual(words('element', 'F2'), { definition: 'F2', uses: 0 });
    assert.deepEqual(words('let', 'f0'), { definition: 'f0', uses: 1 });
    assert.deepEqual(words('goal', 'yield >= 95 %'), { definition: 'yield >= 95 %', uses: 0 });
  });

  it('are found in tunables, channels, sources and measurements', () => {
    const other = seeds[1].replace('channels: 863.1 MHz .. 869.9 MHz step 400 kHz', 'channels: high');
    const found = namesIn(read(other).syntax);
    const uses = (kind: string, name: string) => found.find((each) => each.kind === kind && each.name === name)?.references.map(({ start, end }) => other.slice(start, end));
    assert.deepEqual(uses('tunable', 'antcap'), ['antcap', 'antcap']);
    assert.deepEqual(uses('band', 'high'), ['high', 'high', 'high']);
    assert.deepEqual(uses('element', 'T1'), ['T1']);
    assert.deepEqual(uses('element', 'L3'), ['L3']);
    assert.equal(uses('element', 'load'), undefined);
  });

  it('are found at a place, before the goal around them', () => {
    assert.equal(nameAt(names, text.indexOf('uplink\n  - gain') + 2)?.kind, 'band');
    assert.equal(nameAt(names, text.indexOf('return loss'))?.kind, 'goal');
    assert.equal(nameAt(names, text.indexOf('coils: ind'))?.name, 'coils');
    assert.equal(nameAt(names, 0), null);
  });

  it('are there without a definition, too', () => {
    const lost = namesIn(read('ladder:\n  - series L1: 3 nH from coil\n').syntax).find(({ kind }) => kind === 'family');
    assert.deepEqual([lost?.name, lost?.definition, lost?.references.length], ['coil', null, 1]);
  });
});

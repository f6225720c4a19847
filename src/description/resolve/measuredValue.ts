import { partImpedance } from '../../network/partImpedance';
import type { NetworkData } from '../../network/networkData';
import { idealPart, type PartKind } from '../../network/part';

/** No measurement in series is better than this. */
const measuredDigits = 4;

/** The value of a part measured in series between two ports, from its reactance (a resistor's: resistance) at the lowest frequency above zero; to the digits that one writes, so that a description can name it. Null without sense. */
export function measuredValue(kind: PartKind, data: NetworkData): number | null {
  const lowest = data.frequencyHz.find((frequency) => frequency > 0);
  if (lowest === undefined || data.ports !== 2) return null;
  const { impedance } = partImpedance({ ...idealPart(kind, 1), measured: data }, Float64Array.of(lowest));
  const omega = 2 * Math.PI * lowest;
  const value = kind === 'resistor' ? impedance.re[0] : kind === 'inductor' ? impedance.im[0] / omega : -1 / (omega * impedance.im[0]);
  return value > 0 && Number.isFinite(value) ? Number(value.toPrecision(measuredDigits)) : null;
}

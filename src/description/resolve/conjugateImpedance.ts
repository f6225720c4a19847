import { conjugate } from '../../network/complex';
import type { Impedance } from '../../network/impedance';

/** The complex conjugate at every frequency; null where a coil or capacitor makes it something no impedance tree states. */
export function conjugateImpedance(impedance: Impedance): Impedance | null {
  switch (impedance.form) {
    case 'constant':
      return { ...impedance, impedanceOhm: conjugate(impedance.impedanceOhm) };
    case 'reflection':
      return { ...impedance, reflection: conjugate(impedance.reflection) };
    case 'file':
      // The conjugate of S against real references is the conjugate of Z; it is linear in S, so for two ports driven differentially too.
      return { ...impedance, data: { ...impedance.data, sIm: impedance.data.sIm.map((value) => -value) } };
    case 'table':
      return { ...impedance, reflectionIm: impedance.reflectionIm.map((value) => -value) };
    case 'part':
      return impedance.part.kind === 'resistor' && impedance.part.eslH === 0 && !impedance.part.measured ? impedance : null;
    case 'series':
    case 'parallel': {
      const members = impedance.members.map(conjugateImpedance);
      return members.includes(null) ? null : { ...impedance, members: members as Impedance[] };
    }
    default:
      return impedance;
  }
}

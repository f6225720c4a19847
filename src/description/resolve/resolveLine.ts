import type { Line } from '../../network/line';
import { microstripLine } from '../../network/microstrip';
import type { LineSyntax } from '../syntax';
import { problemAt, type Resolution } from './resolution';

const lightSpeed = 299_792_458;

/** A line of a known length; for a `solve` one of the length that is asked for. Null where a number has no sense, which is reported. */
export function resolveLine(syntax: LineSyntax, resolution: Pick<Resolution, 'report'>, solvedLengthM: number | null = null): Line | null {
  const numbers = lineNumbers(syntax);
  for (const { quantity, what } of numbers) {
    if (quantity && !(quantity.value > 0 && Number.isFinite(quantity.value))) {
      resolution.report(problemAt('not-positive', `${what} of a line is above zero.`, quantity.span));
      return null;
    }
  }
  const { medium, length, velocityFactor, loss } = syntax;
  if (velocityFactor && velocityFactor.value > 1) {
    resolution.report(problemAt('velocity-factor', 'A velocity factor is at most 1: nothing travels faster than light.', velocityFactor.span));
    return null;
  }
  if (loss && loss.db.value < 0) {
    resolution.report(problemAt('negative-loss', 'The loss of a line is zero or above.', loss.db.span));
    return null;
  }
  const vf = velocityFactor?.value ?? 1;
  const lengthM = length.form === 'solve' ? solvedLengthM ?? 0 : length.form === 'physical' ? length.lengthM.value : 0;
  if (medium.form === 'microstrip') {
    const geometry = {
      widthM: medium.widthM.value, heightM: medium.heightM.value, permittivity: medium.permittivity.value,
      copperM: medium.copperM?.value ?? null, lossTangent: medium.lossTangent?.value ?? null,
    };
    if (length.form !== 'electrical') return microstripLine({ ...geometry, lengthM });
    const perMetre = microstripLine({ ...geometry, lengthM: 1 });
    return microstripLine({ ...geometry, lengthM: (length.wavelengths.value * lightSpeed * perMetre.velocityFactor) / length.atHz.value });
  }
  const metres = length.form === 'electrical' ? (length.wavelengths.value * lightSpeed * vf) / length.atHz.value : lengthM;
  return {
    impedanceOhm: medium.impedanceOhm.value, lengthM: metres, velocityFactor: vf,
    conductorLossDb: loss ? loss.db.value * (loss.per === 'metre' ? metres : 1) : 0,
    dielectricLossDb: 0,
    lossAtHz: loss?.atHz.value ?? 1,
  };
}

function lineNumbers({ medium, length, velocityFactor, loss }: LineSyntax) {
  return [
    ...(medium.form === 'uniform'
      ? [{ quantity: medium.impedanceOhm, what: 'The impedance' }]
      : [{ quantity: medium.widthM, what: 'The width' }, { quantity: medium.heightM, what: 'The height' }, { quantity: medium.permittivity, what: 'The permittivity' }]),
    ...(length.form === 'physical' ? [{ quantity: length.lengthM, what: 'The length' }] : []),
    ...(length.form === 'electrical' ? [{ quantity: length.wavelengths, what: 'The length' }, { quantity: length.atHz, what: 'The frequency of the length' }] : []),
    { quantity: velocityFactor, what: 'The velocity factor' },
    { quantity: loss?.atHz ?? null, what: 'The frequency of the loss' },
  ];
}

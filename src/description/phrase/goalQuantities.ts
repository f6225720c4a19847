import type { Comparison, GoalCondition, GoalQuantity } from '../../study/goal';
import type { QuantityKind } from './readQuantity';

/** How a goal's quantity is written and what its limit may be. */
export interface GoalWord {
  readonly quantity: GoalQuantity;
  readonly kinds: readonly QuantityKind[];
  /** Takes the name of an element behind it. */
  readonly ofElement?: true;
  /** The way in which it is usually asked for. */
  readonly usual: Comparison;
  readonly example: string;
}

/** One table for reading, completion and templates. */
export const goalWords: readonly GoalWord[] = [
  { quantity: 'return loss', kinds: ['decibels'], usual: '>=', example: 'return loss >= 10 dB' },
  { quantity: 'VSWR', kinds: ['number'], usual: '<=', example: 'VSWR <= 2' },
  { quantity: 'reflection', kinds: ['number'], usual: '<=', example: 'reflection <= 0.316' },
  { quantity: 'mismatch loss', kinds: ['decibels'], usual: '<=', example: 'mismatch loss <= 0.5 dB' },
  { quantity: 'gain', kinds: ['decibels'], usual: '>=', example: 'gain >= -1.5 dB' },
  { quantity: 'insertion loss', kinds: ['decibels'], usual: '<=', example: 'insertion loss <= 1.5 dB' },
  { quantity: 'efficiency', kinds: ['ratio', 'decibels'], usual: '>=', example: 'efficiency >= 80 %' },
  { quantity: 'rejection', kinds: ['decibels'], usual: '>=', example: 'rejection >= 18 dB at 2 x uplink into 50 Ω' },
  { quantity: 'input resistance', kinds: ['resistance'], usual: '>=', example: 'input resistance >= 40 Ω' },
  { quantity: 'input reactance', kinds: ['resistance'], usual: '<=', example: 'input reactance <= 10 Ω' },
  { quantity: 'bandwidth', kinds: ['frequency'], usual: '>=', example: 'bandwidth >= 10 MHz' },
  { quantity: 'voltage', kinds: ['voltage'], ofElement: true, usual: '<=', example: 'voltage C1 <= 25 V' },
  { quantity: 'current', kinds: ['current'], ofElement: true, usual: '<=', example: 'current L1 <= 300 mA' },
  { quantity: 'dissipation', kinds: ['power'], ofElement: true, usual: '<=', example: 'dissipation L1 <= 0.1 W' },
  { quantity: 'parts', kinds: ['integer'], usual: '<=', example: 'parts <= 3' },
  { quantity: 'yield', kinds: ['ratio'], usual: '>=', example: 'yield >= 95 %' },
];

export const goalConditions: readonly GoalCondition[] = ['dc short at load', 'dc path', 'dc block'];

/** Words of others for the same, and what they are called here. */
export const goalSlips: Readonly<Record<string, GoalQuantity>> = {
  RL: 'return loss', 'Return loss': 'return loss', SWR: 'VSWR', vswr: 'VSWR', swr: 'VSWR', IL: 'insertion loss', ML: 'mismatch loss', Gain: 'gain', gamma: 'reflection', BW: 'bandwidth', loss: 'insertion loss',
};

/** Logarithmic measures whose sign is turned: S11 in dB is the negative of the return loss. */
export const signedSlips: Readonly<Record<string, 'return loss' | 'gain'>> = { S11: 'return loss', s11: 'return loss', S22: 'return loss', S21: 'gain', s21: 'gain' };

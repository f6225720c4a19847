import { removeFixture } from '../../network/fixture';
import { reflectionOf, sampleImpedance } from '../../network/immittance';
import type { LoadCase } from '../../study/problem';
import type { CaseSyntax, DescriptionSyntax } from '../syntax';
import { reportTwice } from './findName';
import { doubtAt, type Resolution } from './resolution';
import { resolveElement } from './resolveElement';
import { resolveImpedance } from './resolveImpedance';

/** A lossless load in a file of four digits comes out above 1 by less than this. */
const overshootSlack = 1e-4;

/** The cases of the load, each with the fixture that is removed from it: its own, else the common one; only from files. */
export function resolveCases(syntax: DescriptionSyntax, resolution: Resolution): LoadCase[] {
  const common = syntax.fixture.map((element) => resolveElement(element, 'fixture', resolution).element);
  // Without a load, which is reported, what does not depend on it can still be told.
  if (!syntax.load) return [{ name: null, load: { form: 'unknown', reason: 'it could not be read' }, fixture: [] }];
  const { cases } = syntax.load;
  reportTwice(cases.flatMap((each) => each.name ?? []), 'case', resolution.report);
  const seen = new Set<string | null>();
  return cases.flatMap((each): LoadCase[] => {
    const name = each.name?.value ?? null;
    if (seen.has(name)) return [];
    seen.add(name);
    const load = resolveImpedance(each.impedance, resolution);
    const own = each.fixture?.map((element) => resolveElement(element, 'fixture', resolution).element);
    const made = { name, load, fixture: load.form === 'file' ? own ?? common : [] };
    checkOvershoot(each, made, resolution);
    return [made];
  });
}

/** Warns where a measured load reflects more than it receives: at its frequencies, after the fixture is removed. */
function checkOvershoot(syntax: CaseSyntax, { load, fixture }: LoadCase, { report, z0Ohm }: Resolution): void {
  if (load.form !== 'file') return;
  const frequencyHz = load.data.frequencyHz.filter((frequency) => frequency > 0);
  if (frequencyHz.length === 0) return;
  const measured = sampleImpedance(load, frequencyHz);
  const seen = fixture.length > 0 ? removeFixture(measured, fixture, frequencyHz) : measured;
  const { re, im } = reflectionOf(seen, z0Ohm);
  let worst = 1 + overshootSlack;
  let at = -1;
  for (let k = 0; k < frequencyHz.length; k++) {
    const size = Math.hypot(re[k], im[k]);
    if (seen.known[k] && size > worst) {
      worst = size;
      at = k;
    }
  }
  if (at < 0) return;
  const where = `${Number((frequencyHz[at] / 1e6).toPrecision(6))} MHz`;
  const cause = fixture.length > 0 ? 'once the fixture is removed; it states more loss than there was' : 'as measured; the calibration is in doubt';
  report(doubtAt('reflection-above-one', `|Γ| reaches ${worst.toFixed(3)} at ${where} ${cause}.`, syntax.impedance.span));
}

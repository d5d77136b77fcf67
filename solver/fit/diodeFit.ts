/** From facts to the parameters of a diode or an LED: Shockley's law through its forward voltages. */
import { conflictsOf } from './conflicts.ts';
import type { Fact, FitReport, FitResult, Grade } from './fact.ts';
import type { JunctionDefaults, JunctionParameters } from './junctionFit.ts';
import { fitJunction, forwardTargets } from './junctionFit.ts';
import { forwardComparisons, freeOfJunction, withoutCurrent } from './junctionReport.ts';

/** SI units, kelvin; either list may be empty. */
export interface DiodeFacts {
  readonly forwardVoltage: readonly Fact<'current'>[];
  readonly reverseCurrent: readonly Fact<'voltage'>[];
}

export interface DiodeFit {
  readonly parts: Readonly<Record<Grade, JunctionParameters>>;
  /** The current at which the first forward voltage holds: where a temperature coefficient is taken to hold too, A. */
  readonly current: number;
  readonly report: FitReport;
}

export function fitDiode(facts: DiodeFacts, defaults: JunctionDefaults): FitResult<DiodeFit> {
  const unused = [
    ...withoutCurrent('forwardVoltage', facts.forwardVoltage),
    ...facts.reverseCurrent.map((_, index) => ({
      fact: 'reverseCurrent',
      index,
      reason: "a real junction's leakage is not the saturation current of its forward law",
    })),
  ];
  const [first] = forwardTargets(facts.forwardVoltage, 'typical', 'value');
  if (first === undefined) {
    return { ok: false, reasons: ['Without a forward voltage at a stated current no diode can be fitted.'] };
  }
  const fitOf = (grade: Grade) => fitJunction(forwardTargets(facts.forwardVoltage, grade, 'value'), defaults);
  const fits = { low: fitOf('low'), typical: fitOf('typical'), high: fitOf('high') };
  const comparisons = forwardComparisons(
    'forwardVoltage',
    facts.forwardVoltage,
    (grade) => fits[grade].junction,
    'value',
  );
  return {
    ok: true,
    fit: {
      parts: { low: fits.low.junction, typical: fits.typical.junction, high: fits.high.junction },
      current: first.current,
      report: {
        comparisons,
        free: freeOfJunction(fits.typical, 'typical', ''),
        conflicts: conflictsOf(comparisons),
        unused,
      },
    },
  };
}

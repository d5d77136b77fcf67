/** One element alone: its residuals and derivatives at chosen local voltages, without a circuit. */
import { DECLARED_LEAK, type Element } from '../../../solver/index.ts';
import { Phase, type ReadingPoint, type Workspace } from '../../../solver/elements/law.ts';

export interface LocalPoint {
  /** A for terminals and internal nodes, V for branches. */
  readonly residual: Float64Array;
  /** Dense, [row][column]. */
  readonly jacobian: readonly Float64Array[];
  readonly work: Workspace;
}

export function evaluateElement(
  element: Element,
  unknowns: readonly number[],
  temperature = 298.15,
  leak = DECLARED_LEAK,
): LocalPoint {
  const { law } = element;
  const width = law.terminals.length + law.internals.length + law.branches.length;
  if (unknowns.length !== width) throw new RangeError(`${law.name} has ${width} unknowns`);
  const work: Workspace = {
    x: Float64Array.from(unknowns),
    residual: new Float64Array(width),
    jacobian: new Float64Array(law.pattern.length).fill(NaN),
    derived: new Float64Array(law.derivedSize),
    memory: new Float64Array(law.memorySize),
    phase: Phase.exact,
    linearKnown: false,
    limited: false,
    sourceScale: 1,
    gainScale: 1,
  };
  law.derive(element.values, { temperature, leak }, work.derived, 0);
  law.load(work, { count: 1, unknown: 0, slot: 0, derived: 0, memory: 0 });
  const jacobian = Array.from({ length: width }, () => new Float64Array(width));
  law.pattern.forEach(([row, column], slot) => {
    const line = jacobian[row];
    if (line) line[column] = (line[column] ?? NaN) + (work.jacobian[slot] ?? NaN);
  });
  return { residual: work.residual, jacobian, work };
}

/** What the law reads at those voltages. */
export function readElement<Operating>(
  element: Element<Operating>,
  unknowns: readonly number[],
  temperature = 298.15,
): Operating {
  const { residual, work } = evaluateElement(element, unknowns, temperature);
  const point: ReadingPoint = {
    unknowns: work.x,
    currents: residual.slice(0, element.law.terminals.length),
    values: element.values,
    derived: work.derived,
    temperature,
  };
  return element.law.read(point);
}

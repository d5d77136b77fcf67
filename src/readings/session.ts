import { prepare, settle } from '../../solver/index.ts';
import type { Preparation } from '../../solver/index.ts';
import type { StageDocument } from '../stage/schema/stage.ts';
import { inState } from '../stage/states.ts';
import type { Fault, Result } from '../values/result.ts';
import { compileStage, kelvin, refreshPart } from './compile.ts';
import type { CompiledStage } from './compile.ts';
import { partDuty } from './duty/partDuty.ts';
import type { PartDuty } from './duty/partDuty.ts';
import type { TransistorProbe } from './headroom/control.ts';
import { pointOf } from './point.ts';
import { readState } from './readState.ts';
import type { StateReadings } from './readings.ts';
import { drawingSnags, structureSnag } from './snags/index.ts';
import { straightAcrossSnags } from './snags/straightAcross.ts';
import { unsettledState } from './unsettled.ts';

export interface SettleConditions {
  /** °C; replaces value and range of the document. */
  readonly ambient?: number;
  readonly law?: 'square' | 'smooth';
}

/** How thoroughly one settle is done. */
export interface SettleEffort {
  /** Newton alone, at most so many iterations: for a frame. All methods where left out. */
  readonly frame?: number;
  readonly signal?: AbortSignal;
}

/** The document in a state, with conditions put in place of its own; undefined where there is no such state. */
const standing = (
  document: StageDocument,
  state: string,
  { ambient, law }: SettleConditions,
): StageDocument | undefined => {
  const there = inState(document, state);
  if (there === undefined || (ambient === undefined && law === undefined)) return there;
  return {
    ...there,
    conditions: {
      ...there.conditions,
      ...(ambient === undefined ? {} : { ambient }),
      ...(law === undefined ? {} : { law }),
    },
  };
};

/**
 * One state of a document, kept ready: figures change and it settles again from where it rested, without being set up
 * anew. What changes the structure (wires, a switch, a state, the law) needs a new session.
 */
export class SettleSession {
  readonly #compiled: Result<CompiledStage>;
  readonly #preparation: Preparation | null;
  readonly #duties: ReadonlyMap<string, PartDuty>;
  readonly #probes = new Map<number, TransistorProbe>();
  #start: Float64Array | null = null;

  private constructor(document: StageDocument) {
    this.#compiled = compileStage(document);
    if (!this.#compiled.ok) {
      this.#preparation = null;
      this.#duties = new Map();
      return;
    }
    const { circuit, parts, conditions } = this.#compiled.value;
    this.#preparation = circuit.elements.length === 0 ? null : prepare(circuit);
    this.#duties = new Map(
      parts.flatMap((part) => {
        const duty = partDuty(part, conditions.ambient.nominal);
        return duty === null ? [] : [[part.id, duty] as const];
      }),
    );
  }

  /**
   * @param state a state's name
   * @returns undefined where the document has no such state
   */
  static open(
    document: StageDocument,
    state: string,
    conditions: SettleConditions = {},
  ): SettleSession | undefined {
    const there = standing(document, state, conditions);
    return there === undefined ? undefined : new SettleSession(there);
  }

  /** The circuit and its map; undefined where a part cannot become elements. */
  get compiled(): CompiledStage | undefined {
    return this.#compiled.ok ? this.#compiled.value : undefined;
  }

  /** What is asked of each part, by id. */
  get duties(): ReadonlyMap<string, PartDuty> {
    return this.#duties;
  }

  /**
   * Changes one figure of a part, SI, by the key of its `draws` (`resistance`, `threshold`).
   *
   * @returns false where the part has no such figure, and nothing is changed
   */
  setValue(part: string, key: string, value: number): boolean {
    const compiled = this.compiled?.partOf.get(part);
    if (compiled === undefined || !Object.hasOwn(compiled.figures, key)) return false;
    compiled.figures[key] = value;
    refreshPart(compiled);
    return true;
  }

  /** Settles at the figures at hand, from the last point where there is one. */
  settle({ frame, signal }: SettleEffort = {}): StateReadings {
    if (!this.#compiled.ok) return unsettledState(fromFaults(this.#compiled.faults), []);
    const compiled = this.#compiled.value;
    const snags = drawingSnags(compiled);
    const preparation = this.#preparation;
    if (preparation === null) return readState({ compiled, duties: this.#duties, snags, bench: null });
    if (!preparation.ok) {
      const [first] = preparation.faults;
      return unsettledState(
        {
          reason: first?.message ?? 'the circuit is not sound',
          concerns: preparation.faults.flatMap((fault) => [...fault.elements, ...fault.nodes]),
        },
        [...preparation.faults.map((fault) => structureSnag(compiled, fault)), ...snags],
      );
    }
    const result = settle(preparation.value, {
      temperature: kelvin(compiled.conditions.ambient.nominal),
      ...(this.#start === null ? {} : { start: this.#start }),
      ...(frame === undefined ? {} : { methods: ['direct'], budget: { direct: frame } }),
      ...(signal === undefined ? {} : { signal }),
    });
    if (!result.settled) {
      // A start that leads nowhere is not tried again.
      this.#start = null;
      return unsettledState(
        { reason: result.message, concerns: [...result.elements, ...result.nodes] },
        snags,
      );
    }
    if (result.straightAcross.length > 0) {
      this.#start = null;
      const straight = straightAcrossSnags(compiled, result.straightAcross);
      const reason = straight.map(({ message }) => message).join('; ');
      const concerns = [...new Set(straight.flatMap(({ parts }) => parts))];
      return unsettledState({ reason, concerns }, [...straight, ...snags]);
    }
    this.#start = result.state;
    const bench = {
      compiled,
      prepared: preparation.value,
      probes: this.#probes,
      ambient: compiled.conditions.ambient.nominal,
    };
    return readState({
      compiled,
      duties: this.#duties,
      snags,
      bench: { ...bench, point: pointOf(compiled, result) },
    });
  }
}

const fromFaults = (faults: readonly Fault[]) => ({
  reason: faults.map((fault) => fault.message).join(' '),
  concerns: [...new Set(faults.flatMap((fault) => fault.parts ?? []))],
});

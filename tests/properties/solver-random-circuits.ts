/**
 * Random circuits, seeded: 1 … 12 MOSFETs (or more), resistors 10 Ω … 10 MΩ, diodes, any bodies, two rails; on request
 * bipolar transistors, amplifiers and current sources. Every circuit passes the structure checks.
 */
import {
  amplifier,
  bipolar,
  currentSource,
  diode,
  mosfet,
  resistor,
  voltageSource,
  type Circuit,
  type Element,
} from '../../solver/index.ts';
import { checkStructure } from '../../solver/structure/check.ts';

/** A stream of numbers in [0, 1) from a 32-bit seed: xorshift, 13-17-5 (Marsaglia 2003), the seed scrambled first. */
export function randomStream(seed: number): () => number {
  let state = Math.imul(seed ^ 0x9e3779b9, 0x85ebca6b) ^ (seed >>> 13) || 1;
  const next = () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) / 2 ** 32;
  };
  for (let k = 0; k < 8; k++) next();
  return next;
}

export interface RandomCircuitOptions {
  readonly law: 'square' | 'smooth';
  /** 1 … this many MOSFETs; 12. */
  readonly mosfets?: number;
  /** Bipolar transistors, amplifiers and current sources too; false. */
  readonly mixed?: boolean;
  /** MOSFETs with series resistances among them; true. */
  readonly series?: boolean;
}

/** The circuit of a seed. The same seed and options always give the same circuit. */
export function randomCircuit(seed: number, options: RandomCircuitOptions): Circuit {
  for (let attempt = 0; ; attempt++) {
    const circuit = draw(randomStream(seed + attempt * 0x1000193), options);
    if (checkStructure(circuit).length === 0) return circuit;
  }
}

function draw(
  random: () => number,
  { law, mosfets = 12, mixed = false, series = true }: RandomCircuitOptions,
): Circuit {
  const whole = (low: number, high: number) => low + Math.floor(random() * (high - low + 1));
  const spread = (low: number, high: number) => low * (high / low) ** random(); // log-uniform
  const chance = (probability: number) => random() < probability;

  const transistors = whole(1, mosfets);
  const inner = whole(1, 2 + Math.ceil(transistors * 1.3));
  const nodes = ['ground', 'rail 1', 'rail 2', ...Array.from({ length: inner }, (_, k) => `n${k + 1}`)];
  const any = () => whole(0, nodes.length - 1);
  const free = () => whole(3, nodes.length - 1);
  const elements: Element[] = [
    voltageSource('V1', [1, 0], { voltage: spread(1.8, 48) }),
    voltageSource('V2', [2, 0], { voltage: (chance(0.4) ? -1 : 1) * spread(1.8, 24) }),
  ];

  for (let k = 1; k <= transistors; k++) {
    const polarity = chance(0.5) ? 1 : -1;
    const drain = chance(0.8) ? free() : any();
    const source = chance(0.5) ? free() : any();
    const gate = any();
    const sensible = polarity > 0 ? 0 : 1;
    const body = chance(0.55) ? source : chance(0.6) ? sensible : any();
    elements.push(
      mosfet(`Q${k}`, [drain, gate, source, body], {
        polarity,
        law,
        threshold: polarity * (chance(0.1) ? -1 : 1) * (0.3 + 3 * random()),
        gainFactor: spread(1e-5, 10),
        lengthModulation: chance(0.5) ? 0.1 * random() : 0,
        bodyFactor: chance(0.5) ? random() : 0,
        surfacePotential: 0.5 + 0.5 * random(),
        slopeFactor: 1.1 + 0.5 * random(),
        drainResistance: chance(0.2) && series ? spread(1e-2, 10) : 0,
        sourceResistance: chance(0.2) && series ? spread(1e-2, 10) : 0,
        bodyDiode: { saturationCurrent: spread(1e-15, 1e-9), emissionCoefficient: 1 + random() },
      }),
    );
  }
  // Enough resistors that most nodes have one.
  const resistors = inner + whole(0, inner);
  for (let k = 1; k <= resistors; k++) {
    const a = k <= inner ? k + 2 : free();
    elements.push(resistor(`R${k}`, [a, any()], { resistance: spread(10, 1e7) }));
  }
  for (let k = 1; k <= whole(0, 3); k++)
    elements.push(
      diode(`D${k}`, [any(), free()], {
        saturationCurrent: spread(1e-15, 1e-8),
        emissionCoefficient: 1 + random(),
        seriesResistance: chance(0.5) ? spread(1e-3, 10) : 0,
      }),
    );
  if (mixed) {
    for (let k = 1; k <= whole(1, 4); k++)
      elements.push(
        bipolar(`T${k}`, [any(), free(), any()], {
          polarity: chance(0.5) ? 1 : -1,
          saturationCurrent: spread(1e-16, 1e-12),
          forwardGain: spread(20, 500),
          reverseGain: spread(0.5, 10),
          ...(chance(0.5) ? { earlyVoltage: spread(20, 200) } : {}),
        }),
      );
    for (let k = 1; k <= whole(0, 2); k++)
      elements.push(currentSource(`I${k}`, [any(), free()], { current: spread(1e-7, 1e-2) }));
    if (chance(0.5)) {
      const gain = spread(1e2, 1e6);
      if (chance(0.5)) elements.push(amplifier('U1', [free(), any(), free(), 1, 0], { gain }));
      else {
        // Nothing holds an ideal output but its own feedback: inverting input and output are the amplifier's own,
        // and the other input stands on a rail, or the output might drive itself off without end.
        nodes.push('summing', 'output');
        const summing = nodes.length - 2;
        const output = nodes.length - 1;
        elements.push(
          amplifier('U1', [whole(0, 2), summing, output], { gain }),
          resistor('RF', [output, summing], { resistance: spread(1e3, 1e6) }),
          resistor('RI', [summing, whole(0, nodes.length - 3)], { resistance: spread(1e3, 1e6) }),
          resistor('RL', [output, whole(0, nodes.length - 3)], { resistance: spread(1e3, 1e6) }),
        );
      }
    }
  }
  return { nodes, elements };
}

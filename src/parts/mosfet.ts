import { currentSource, mosfet as element } from '../../solver/index.ts';
import type { MosfetOperating } from '../../solver/index.ts';
import { symbols } from '../../symbols/index.ts';
import { formatStated } from '../values/value-text.ts';
import { definePart } from './definePart.ts';
import { deviceOf, titleLine } from './deviceOf.ts';
import { mosfetFit } from './devices/fitting.ts';
import { mosfetAssumptions, mosfetDraws } from './devices/mosfetDraws.ts';
import { mosfetFromFigures } from './devices/mosfetParameters.ts';
import type { MosfetDevice } from './devices/mosfetSchema.ts';
import { optional } from './field.ts';
import type { ElectricalContext, PartContext, Variant } from './kind.ts';
import type { MosfetFigures } from './readout.ts';
import { specOf } from './values.ts';

const deviceOfPart = (context: PartContext) => deviceOf(context, 'mosfet');

const isProcess = (device: MosfetDevice) => device.model?.processTransconductance !== undefined;

/** Node of the body: an unwired body is joined to the source. */
const bodyNode = ({ wired, node }: ElectricalContext) => node(wired.has('body') ? 'body' : 'source');

const starting = (channel: 'n' | 'p', build: 'discrete' | 'integrated'): MosfetDevice => {
  const sign = channel === 'n' ? 1 : -1;
  return {
    type: 'mosfet',
    channel,
    build,
    model:
      build === 'discrete'
        ? { threshold: 1.6 * sign, gainFactor: 0.08 }
        : { threshold: 0.7 * sign, gainFactor: 0.001, bodyFactor: 0.5 },
  };
};

const variants: readonly Variant[] = (['n', 'p'] as const).flatMap((channel): Variant[] => [
  {
    key: `mosfet-${channel}`,
    title: `MOSFET, ${channel}-channel`,
    values: {},
    device: starting(channel, 'discrete'),
  },
  {
    key: `mosfet-${channel}-body`,
    title: `MOSFET, ${channel}-channel, body brought out`,
    values: {},
    device: starting(channel, 'integrated'),
    wired: ['body'],
  },
]);

const readFigures = (operating: MosfetOperating, context: ElectricalContext): MosfetFigures => {
  const { inversion, inversionCoefficient } = operating;
  return {
    region: operating.region,
    reversed: operating.reversed,
    ...(context.law === 'smooth' && inversion !== undefined && inversionCoefficient !== undefined
      ? { inversion, inversionCoefficient }
      : {}),
    gateToSource: operating.gateToSource,
    drainToSource: operating.drainToSource,
    sourceToBody: operating.sourceToBody,
    threshold: operating.threshold,
    overdrive: operating.overdrive,
    saturationVoltage: operating.saturationVoltage,
    drainCurrent: operating.drainCurrent,
    transconductance: operating.transconductance,
    bodyTransconductance: operating.bodyTransconductance,
    outputConductance: operating.outputConductance,
    power: operating.power,
  };
};

export const mosfet = definePart({
  kind: 'mosfet',
  title: 'MOSFET',
  family: 'transistors',
  variants,
  deviceTypes: ['mosfet'],
  takesDuty: true,
  fields: [{ ...optional('width', 'width', 'length') }, { ...optional('length', 'length', 'length') }],
  check: (context) => {
    const needed = isProcess(deviceOfPart(context));
    return ['width', 'length'].flatMap((key) => {
      if ((specOf(context.values, key) !== undefined) === needed) return [];
      return [
        needed
          ? {
              code: 'missing-size',
              message: `Its device states a process transconductance, so ${context.name} must state its ${key}.`,
              path: `values.${key}`,
              found: 'nothing',
              allowed: 'a length',
            }
          : {
              code: 'size-without-process',
              message: `Its device states the gain of a whole transistor, so ${context.name} has no ${key} of its own.`,
              path: `values.${key}`,
              found: `a ${key}`,
              allowed: 'nothing',
            },
      ];
    });
  },
  designator: () => 'Q',
  symbol: (context) => {
    const { channel, build } = deviceOfPart(context);
    const form = context.wired.has('body') ? '-body' : build === 'integrated' ? '-plain' : '';
    return symbols[`mosfet-${channel}${form}`];
  },
  text: (context) => {
    const [width, length] = [specOf(context.values, 'width'), specOf(context.values, 'length')];
    return [
      ...titleLine(context),
      ...(width === undefined || length === undefined
        ? []
        : [`${formatStated(width, 'length')} / ${formatStated(length, 'length')}`]),
    ];
  },
  draws: (context, law) => mosfetDraws(deviceOfPart(context), context.values, law),
  assumptions: (context, law) => mosfetAssumptions(deviceOfPart(context), law),
  elements: (context) => {
    const { name, node, figures, law } = context;
    const device = deviceOfPart(context);
    const fit = device.model === undefined ? mosfetFit(device, law) : undefined;
    const channel = element(
      name,
      [node('drain'), node('gate'), node('source'), bodyNode(context)],
      mosfetFromFigures(device, figures, law, fit?.ok === true ? fit.value : undefined),
    );
    const { gateLeakage } = figures;
    if (gateLeakage === undefined) return [channel];
    const leak = currentSource(`${name} gate leakage`, [node('gate'), node('source')], {
      current: gateLeakage,
    });
    return [channel, leak];
  },
  readout: (context) => {
    const { amps, figures, wired } = context;
    const leakage = figures.gateLeakage === undefined ? 0 : amps(1, 0);
    const body = amps(0, 3);
    return {
      shape: 'mosfet',
      figures: readFigures(context.operating(0) as MosfetOperating, context),
      pinCurrents: {
        gate: amps(0, 1) + leakage,
        drain: amps(0, 0),
        source: amps(0, 2) - leakage + (wired.has('body') ? 0 : body),
        body: wired.has('body') ? body : 0,
      },
    };
  },
});

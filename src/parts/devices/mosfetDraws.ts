import type { MosfetFit } from '../../../solver/fit/index.ts';
import { grades } from '../../../solver/fit/index.ts';
import type { Result } from '../../values/result.ts';
import { success } from '../../values/result.ts';
import type { Draw, Law, Values } from '../kind.ts';
import { defaultDraw, drawOf, specOf } from '../values.ts';
import { fitReportsOf, freeClauses, middleOf, mosfetFactFigures, mosfetFit } from './fitting.ts';
import { gradeDraw } from './grade.ts';
import { commonParameters, modelParameters, polarityOf } from './mosfetParameters.ts';
import type { MosfetDevice } from './mosfetSchema.ts';
import { parameterAssumptions, parameterDraws } from './parameter.ts';

/** A channel's width and length, where its device is a process and not a finished transistor. */
const sizeDraws = (device: MosfetDevice, values: Values): readonly Draw[] =>
  device.model?.processTransconductance === undefined
    ? []
    : ['width', 'length'].flatMap((key) => {
        const spec = specOf(values, key);
        return spec === undefined ? [] : [drawOf(key, 'length', spec)];
      });

/** The gate current is nought at nominal; a leakage that is stated flows either way over the spread. */
const leakageDraws = (device: MosfetDevice): readonly Draw[] => {
  const [fact] = mosfetFactFigures(device).gateLeakage;
  if (fact === undefined) return [];
  const most = fact.high ?? fact.typical ?? fact.low ?? 0;
  return [{ key: 'gateLeakage', quantity: 'current', value: 0, low: -most, high: most, stated: true }];
};

const fact = (draw: Draw): Draw => ({ ...draw, stated: true });

/** What the facts determined, at the typical part; the grade moves it together. */
const fittedDraws = (device: MosfetDevice, law: Law, { parts }: MosfetFit): readonly Draw[] => {
  const { threshold, gainFactor, drainResistance, sourceResistance, bodyDiode } = parts.typical;
  const hasSpread = grades.some(
    (grade) =>
      parts[grade].threshold !== threshold ||
      parts[grade].gainFactor !== gainFactor ||
      parts[grade].bodyDiode.saturationCurrent !== bodyDiode.saturationCurrent,
  );
  const [coefficient] = mosfetFactFigures(device).thresholdTemperatureCoefficient;
  const common = parameterDraws(commonParameters(device, law), {}).map((draw): Draw => {
    if (draw.key !== 'thresholdTemperatureCoefficient' || coefficient === undefined) return draw;
    const value = middleOf(coefficient);
    return { ...draw, value, low: coefficient.low ?? value, high: coefficient.high ?? value, stated: true };
  });
  return [
    gradeDraw(hasSpread),
    fact(defaultDraw('threshold', 'threshold', polarityOf(device) * threshold)),
    fact(defaultDraw('gainFactor', 'gainFactor', gainFactor)),
    ...common,
    fact(defaultDraw('drainResistance', 'seriesResistance', drainResistance)),
    fact(defaultDraw('sourceResistance', 'seriesResistance', sourceResistance)),
    fact(defaultDraw('bodyDiode.saturationCurrent', 'saturationCurrent', bodyDiode.saturationCurrent)),
    fact(defaultDraw('bodyDiode.emissionCoefficient', 'emissionCoefficient', bodyDiode.emissionCoefficient)),
    fact(defaultDraw('bodyDiode.seriesResistance', 'seriesResistance', bodyDiode.seriesResistance)),
    ...leakageDraws(device),
  ];
};

export const mosfetDraws = (device: MosfetDevice, values: Values, law: Law): Result<readonly Draw[]> => {
  if (device.model !== undefined) {
    return success([
      ...parameterDraws(modelParameters(device, law), device.model),
      ...sizeDraws(device, values),
    ]);
  }
  const fit = mosfetFit(device, law);
  return fit.ok ? success(fittedDraws(device, law, fit.value)) : fit;
};

export const mosfetAssumptions = (device: MosfetDevice, law: Law): readonly string[] => {
  if (device.model !== undefined) return parameterAssumptions(modelParameters(device, law), device.model);
  const stated =
    device.facts?.thresholdTemperatureCoefficient === undefined ? {} : { thresholdTemperatureCoefficient: 0 };
  // Length modulation is among what the fit says it left open.
  return [
    ...parameterAssumptions(commonParameters(device, law), { ...stated, lengthModulation: 0 }),
    ...freeClauses(fitReportsOf(device, law)),
  ];
};

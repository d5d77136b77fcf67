/** From a data sheet's facts to the parameters of the device laws. SI units, kelvin. */
export { fitBipolar } from './bipolarFit.ts';
export type { BipolarDefaults, BipolarFacts, BipolarFit } from './bipolarFit.ts';
export { fitDiode } from './diodeFit.ts';
export type { DiodeFacts, DiodeFit } from './diodeFit.ts';
export { grades } from './fact.ts';
export type {
  Bound,
  Comparison,
  Conflict,
  Fact,
  FitReport,
  FitResult,
  FreeParameter,
  Grade,
  UnusedFact,
} from './fact.ts';
export type { JunctionDefaults, JunctionParameters } from './junctionFit.ts';
export type { MosfetDefaults } from './mosfetChannelFit.ts';
export { fitMosfet } from './mosfetFit.ts';
export type { MosfetFit } from './mosfetFit.ts';
export type { FittedMosfet } from './mosfetReport.ts';
export type { MosfetFacts } from './mosfetTargets.ts';
export { fitBreakdown } from './zenerFit.ts';
export type { BreakdownFacts, BreakdownFit } from './zenerFit.ts';

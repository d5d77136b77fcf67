import type { Limit } from '../../../solver/questions/limit.ts';
import { amperes, volts } from '../words.ts';
import type { Condition, Measure } from './condition.ts';
import type { AmplifyTerms } from './terms.ts';

const missed = (
  element: number,
  quantity: string,
  sense: Limit['sense'],
  bound: number,
  say: (quantity: number) => string,
): Condition => ({
  limit: { element, quantity, sense, bound },
  loses: 'missed',
  whenNotSet: 'lost',
  say: (value) => [say(value)],
});

const windowConditions = (element: number, quantity: string, terms: AmplifyTerms): readonly Condition[] => {
  const { low, high } = terms.currentWindow ?? {};
  return [
    ...(low === undefined
      ? []
      : [
          missed(
            element,
            quantity,
            'least',
            low,
            (value) => `the current is ${amperes(value)}, less than the ${amperes(low)} of its window`,
          ),
        ]),
    ...(high === undefined
      ? []
      : [
          missed(
            element,
            quantity,
            'most',
            high,
            (value) => `the current is ${amperes(value)}, more than the ${amperes(high)} of its window`,
          ),
        ]),
  ];
};

const beyondPeak = (signalPeak: number): string =>
  signalPeak === 0 ? '' : ` with a signal peak of ${volts(signalPeak)}`;

/** A MOSFET amplifies in saturation, not reversed, with room for its signal. Ratings apart. */
export const mosfetAmplify = (element: number, terms: AmplifyTerms): readonly Condition[] => [
  missed(element, 'diodeCarries', 'most', 0, () => 'the body diode carries the current'),
  missed(element, 'conducts', 'least', 1, () => 'the channel is cut off'),
  missed(element, 'reversed', 'most', 0, () => 'drain and source have exchanged roles'),
  missed(
    element,
    'saturationMargin',
    'least',
    terms.signalPeak,
    (value) =>
      `${value < 0 ? 'the drain is' : 'the room is'} ${volts(terms.signalPeak - value)} short of saturation` +
      beyondPeak(terms.signalPeak),
  ),
  ...windowConditions(element, 'drainCurrent', terms),
];

/** |V_DS| − V_DSsat − signal peak; below threshold the overdrive. V. */
export const mosfetAmplifyHeadroom = (element: number, terms: AmplifyTerms, measure: Measure): number => {
  const room = measure(element, 'saturationMargin');
  return measure(element, 'conducts') === 0 ? room : room - terms.signalPeak;
};

/** A bipolar transistor amplifies in its active region, not reversed, with room for its signal. Ratings apart. */
export const bipolarAmplify = (element: number, terms: AmplifyTerms): readonly Condition[] => [
  missed(element, 'active', 'least', 1, () => 'the transistor is not in its active region'),
  missed(element, 'reversed', 'most', 0, () => 'collector and emitter have exchanged roles'),
  missed(
    element,
    'drop',
    'least',
    terms.saturationVoltage + terms.signalPeak,
    (value) =>
      `collector to emitter is ${volts(value)}, less than the saturation voltage of ` +
      `${volts(terms.saturationVoltage)}${beyondPeak(terms.signalPeak)}`,
  ),
  ...windowConditions(element, 'collectorCurrent', terms),
];

/** |V_CE| − V_CE(sat) − signal peak, V. */
export const bipolarAmplifyHeadroom = (element: number, terms: AmplifyTerms, measure: Measure): number =>
  measure(element, 'drop') - terms.saturationVoltage - terms.signalPeak;

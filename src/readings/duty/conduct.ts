import { formatPercent } from '../../values/format.ts';
import type { Limit } from '../../../solver/questions/limit.ts';
import { ohms, pureNumber, volts } from '../words.ts';
import type { Condition, DutyConditions, Measure } from './condition.ts';
import type { ConductTerms, DeviceFacts } from './terms.ts';

/** Share of the current that the channel has to carry. */
const channelShare = 0.9;
/** Factor on the largest stated R_DS(on) where no drop is stated. */
const onResistanceFactor = 1.5;

const noFact = 'entered by model: no data-sheet fact behind it';

/** The limit that ends a conducting switch's headroom: of its drop, its resistance, or its region. */
export const dropLimit = (element: number, terms: ConductTerms, facts: DeviceFacts): Limit => {
  if (terms.dropLimit !== undefined) {
    return { element, quantity: 'drop', sense: 'most', bound: terms.dropLimit };
  }
  if (facts.largestOnResistance !== undefined) {
    const bound = onResistanceFactor * facts.largestOnResistance;
    return { element, quantity: 'onResistance', sense: 'most', bound };
  }
  return { element, quantity: 'edge', sense: 'below', bound: 0 };
};

const sayDrop =
  (limit: Limit) =>
  (value: number): readonly string[] => {
    if (limit.quantity === 'drop') {
      return [`the drop is ${volts(value)}, more than its limit of ${volts(limit.bound)}`];
    }
    if (limit.quantity === 'onResistance') {
      return [
        `the channel has ${ohms(value)}, more than ${onResistanceFactor} times the largest R_DS(on) stated ` +
          `(${ohms(limit.bound / onResistanceFactor)})`,
      ];
    }
    return ['the channel is not in triode', 'region only'];
  };

const coverage = (element: number, facts: DeviceFacts): readonly Condition[] => {
  if (facts.enteredBy === 'model') return [];
  const covered = facts.coveredFrom;
  const bound = facts.polarity * (covered ?? Infinity);
  return [
    {
      limit: { element, quantity: 'gateToSource', sense: facts.polarity === 1 ? 'least' : 'most', bound },
      loses: 'at-risk',
      whenNotSet: 'lost',
      say: (drive) => [
        'drive not covered by a fact',
        covered === undefined
          ? `${volts(drive)} at the gate, and no maximum R_DS(on) is stated`
          : `${volts(drive)} at the gate; a maximum R_DS(on) is stated from ${volts(bound)} on`,
      ],
    },
  ];
};

/** A MOSFET conducts with its channel on, by its channel, within its drop. Ratings apart. */
export const mosfetConduct = (element: number, terms: ConductTerms, facts: DeviceFacts): DutyConditions => {
  const drop = dropLimit(element, terms, facts);
  return {
    conditions: [
      {
        limit: { element, quantity: 'overdrive', sense: 'above', bound: 0 },
        loses: 'missed',
        whenNotSet: 'lost',
        say: (value) => [`the channel is off: overdrive ${volts(value)}`],
      },
      {
        limit: { element, quantity: 'channelShare', sense: 'least', bound: channelShare },
        loses: 'missed',
        whenNotSet: 'lost',
        say: (value) => [
          `the channel carries ${formatPercent(value)} of the current, less than ${formatPercent(channelShare)}; ` +
            'the body diode carries the rest',
        ],
      },
      { limit: drop, loses: 'missed', whenNotSet: 'lost', say: sayDrop(drop) },
      ...coverage(element, facts),
    ],
    remarks: [
      ...(drop.quantity === 'edge' ? ['region only'] : []),
      ...(facts.enteredBy === 'model' ? [noFact] : []),
    ],
  };
};

/** A bipolar transistor conducts saturated, with base current enough for its forced gain. Ratings apart. */
export const bipolarConduct = (element: number, terms: ConductTerms): DutyConditions => ({
  conditions: [
    {
      limit: { element, quantity: 'saturated', sense: 'least', bound: 1 },
      loses: 'missed',
      whenNotSet: 'lost',
      say: () => ['the transistor is not saturated'],
    },
    {
      limit: { element, quantity: 'forcedGain', sense: 'most', bound: terms.forcedGain },
      loses: 'missed',
      whenNotSet: 'lost',
      say: (value) => [`collector over base current is ${pureNumber(value)}, more than ${terms.forcedGain}`],
    },
  ],
  remarks: [],
});

/** I_B·forcedGain/I_C − 1 of a bipolar switch; null where no collector current flows. */
export const bipolarReserve = (element: number, terms: ConductTerms, measure: Measure): number | null => {
  const collector = measure(element, 'currentMagnitude');
  return collector === 0 ? null : (measure(element, 'baseMagnitude') * terms.forcedGain) / collector - 1;
};

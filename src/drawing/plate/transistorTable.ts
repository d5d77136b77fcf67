import type {
  BipolarReading,
  MosfetReading,
  PartReading,
  SettledState,
  Verdict,
} from '../../readings/readings.ts';
import type { StageDocument } from '../../stage/schema/stage.ts';
import { formatQuantity } from '../../values/format.ts';
import { badgeWords } from '../badge/words.ts';
import type { Role } from '../primitives.ts';
import { notFixed } from '../wanted/wanted.ts';
import type { Cell, Table } from './table.ts';

type Transistor = MosfetReading | BipolarReading;

const isTransistor = (reading: PartReading): reading is Transistor =>
  reading.kind === 'mosfet' || reading.kind === 'bipolar';

const verdictRole: Readonly<Record<Verdict, Role>> = {
  held: 'held',
  'at-risk': 'atRisk',
  missed: 'missed',
  'not-checked': 'soft',
};

/** `at risk`: the words of a verdict as they are written for people. */
export const verdictWords = (verdict: Verdict): string => verdict.replaceAll('-', ' ');

/** A row a transistor: what it is, where it rests, what it is for, and whether that is held. */
export const transistorTable = (document: StageDocument, state: SettledState): Table | undefined => {
  const rows = Object.entries(state.parts).flatMap(([name, reading]) =>
    isTransistor(reading) ? [rowOf(name, reading, document)] : [],
  );
  if (rows.length === 0) return undefined;
  return {
    headings: ['transistor', 'device', 'region', 'current', 'duty', 'verdict', 'headroom', 'reasons'],
    rows,
  };
};

const rowOf = (name: string, reading: Transistor, document: StageDocument): readonly Cell[] => {
  const current = reading.kind === 'mosfet' ? reading.drainCurrent : reading.collectorCurrent;
  const device = document.parts[reading.id]?.device;
  const title = device === undefined ? undefined : document.devices[device]?.title;
  return [
    { text: name, weight: 600 },
    { text: title ?? '' },
    { text: regionText(reading) },
    { text: quantity(current, 'A'), role: 'read', align: 'right' },
    { text: reading.duty },
    { text: verdictWords(reading.verdict), role: verdictRole[reading.verdict], weight: 600 },
    { text: quantity(reading.headroom, 'V'), role: 'read', align: 'right' },
    { text: reading.reasons.join('; '), role: 'soft' },
  ];
};

const quantity = (value: unknown, unit: string): string =>
  typeof value === 'number' ? formatQuantity(value, unit) : '–';

const regionText = (reading: Transistor): string => {
  const { region, reversed } = reading;
  if (region === null) return notFixed;
  const inversion = reading.kind === 'mosfet' ? reading.inversion : undefined;
  return badgeWords({ region, reversed, ...(inversion === undefined ? {} : { inversion }) });
};

/** What the command line can be asked: each verb with its options, for reading a call and for telling of them. */

export interface OptionSpec {
  /** Without the dashes. */
  readonly name: string;
  /** What stands after it: `NAME`, `FILE`; left out for an option without a value. */
  readonly value?: string;
  /** The words that may stand there, where only these may. */
  readonly choices?: readonly string[];
  /** Whether it may be given more than once. */
  readonly repeats?: boolean;
  readonly meaning: string;
}

export interface VerbSpec {
  readonly name: string;
  readonly gives: string;
  /** False for a verb of the contract that this version does not answer yet. */
  readonly built: boolean;
  readonly options: readonly OptionSpec[];
}

const conditions: readonly OptionSpec[] = [
  {
    name: 'ambient',
    value: '°C',
    meaning: 'ambient temperature; replaces the value and the range of the file',
  },
  {
    name: 'law',
    value: 'LAW',
    choices: ['square', 'smooth'],
    meaning: 'MOSFET law in place of the one in the file',
  },
];
const help: OptionSpec = { name: 'help', meaning: 'this text' };

const later = (name: string, gives: string): VerbSpec => ({ name, gives, built: false, options: [help] });

export const verbs: readonly VerbSpec[] = [
  {
    name: 'settle',
    gives: 'the operating point of each state, every duty with its verdict, snags and cautions',
    built: true,
    options: [
      {
        name: 'state',
        value: 'NAME',
        repeats: true,
        meaning: 'only this state; may be given more than once',
      },
      ...conditions,
      { name: 'no-spread', meaning: 'nominal values only' },
      { name: 'json', meaning: 'the readings as JSON, for programs' },
      help,
    ],
  },
  {
    name: 'plate',
    gives: 'the annotated drawing as SVG or PNG',
    built: true,
    options: [
      {
        name: 'out',
        value: 'FILE',
        meaning: 'where to write; .svg or .png. Without it, SVG to standard output',
      },
      { name: 'state', value: 'NAME', meaning: 'the state to draw; the base state where none is named' },
      {
        name: 'scale',
        value: 'N',
        choices: ['1', '2', '4'],
        meaning: 'enlargement of a PNG; 1 where none is given',
      },
      {
        name: 'theme',
        value: 'THEME',
        choices: ['light', 'dark', 'print'],
        meaning: 'colours; light where none is named',
      },
      {
        name: 'density',
        value: 'HOW',
        choices: ['all', 'key', 'none'],
        meaning: 'how many readings stand on the drawing; as in the file, else all',
      },
      ...conditions,
      help,
    ],
  },
  later('spread', 'what tolerances, supply and temperature ranges do to every duty'),
  later('window', 'the interval of one value over which every duty is held'),
  later('aim', 'the value that gives a wanted reading'),
  later('sweep', 'a reading against one value'),
  later('curves', 'output characteristics with the load curve'),
  later('signal', 'gain, input and output resistance, frequency response'),
  later('rests', 'every rest point that the search finds'),
  later('service', 'what a meter reads at each test point'),
  later('faults', 'the single fault that explains readings taken'),
  later('record', 'the design record'),
];

export const verbNamed = (name: string): VerbSpec | undefined => verbs.find((verb) => verb.name === name);

import type { ReactElement } from 'react';
import { badgeWords } from '../drawing/badge/words.ts';
import type { BipolarReading, MosfetReading, PartReading, SettledState } from '../readings/readings.ts';
import { Badge } from './Badge.tsx';
import { figureText, inWords } from './figure.ts';

type TransistorReading = MosfetReading | BipolarReading;

const isTransistor = (reading: PartReading): reading is TransistorReading =>
  reading.kind === 'mosfet' || reading.kind === 'bipolar';

function Region({ reading }: { readonly reading: TransistorReading }): ReactElement {
  const { region, reversed, verdict } = reading;
  if (region === null) return <p className="region">not fixed</p>;
  const inversion = reading.kind === 'mosfet' ? reading.inversion : undefined;
  const current = reading.kind === 'mosfet' ? reading.drainCurrent : reading.collectorCurrent;
  const sign = { region, reversed, ...(inversion === undefined ? {} : { inversion }) };
  return (
    <>
      <Badge sign={{ ...sign, family: reading.kind, verdict }} />
      <p className="region">
        {badgeWords(sign)}
        <br />
        <span className="figure">{figureText(current, 'A')}</span>
      </p>
    </>
  );
}

function Transistor({
  name,
  reading,
}: {
  readonly name: string;
  readonly reading: TransistorReading;
}): ReactElement {
  const { duty, verdict, headroom, reasons } = reading;
  return (
    <li className="transistor">
      <h3>
        {name} <small>{duty === 'none' ? 'no duty' : duty}</small>
      </h3>
      <Region reading={reading} />
      <p className={`verdict ${verdict}`}>{inWords(verdict)}</p>
      {headroom !== null && (
        <p className="headroom">
          headroom <span className="figure">{figureText(headroom, 'V')}</span>
        </p>
      )}
      {reasons.length > 0 && <p className="reasons">{reasons.join('; ')}</p>}
    </li>
  );
}

/** A row a transistor, in the order of the readings. */
export function Transistors({ state }: { readonly state: SettledState }): ReactElement {
  const rows = Object.entries(state.parts).flatMap(([name, reading]) =>
    isTransistor(reading) ? [<Transistor key={name} name={name} reading={reading} />] : [],
  );
  return (
    <section>
      <h2>
        transistors <span className="count">{rows.length}</span>
      </h2>
      <ul className="transistors">{rows}</ul>
    </section>
  );
}

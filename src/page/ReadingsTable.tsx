import type { ReactElement } from 'react';
import type { SettledState } from '../readings/readings.ts';
import { figureText } from './figure.ts';

/** The figures of the plate as a table, for who hears the page rather than sees it. */
export function ReadingsTable({
  title,
  state,
}: {
  readonly title: string;
  readonly state: SettledState;
}): ReactElement {
  return (
    <table className="unseen">
      <caption>Readings of {title}</caption>
      <thead>
        <tr>
          <th scope="col">pin</th>
          <th scope="col">voltage</th>
          <th scope="col">current into the part</th>
        </tr>
      </thead>
      <tbody>
        {Object.entries(state.pins).map(([pin, volts]) => (
          <tr key={pin}>
            <th scope="row">{pin.replace('.', ' ')}</th>
            <td>{figureText(volts, 'V')}</td>
            <td>{figureText(state.pinCurrents[pin], 'A')}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

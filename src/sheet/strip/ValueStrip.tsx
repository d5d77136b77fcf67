import { useCallback, useEffect, type KeyboardEvent, type ReactElement } from 'react';
import { useStore } from 'zustand';
import { Choice } from '../../controls/Choice.tsx';
import type { Desk } from '../../desk/desk.ts';
import { withPlain, withTolerance } from '../../desk/edits/setValue.ts';
import { mainValueOf, type PartValue } from '../../desk/partValue.ts';
import { formatPercent } from '../../values/format.ts';
import { quantityOf } from '../../values/quantities.ts';
import type { Result } from '../../values/result.ts';
import type { SeriesName } from '../../values/series.ts';
import { formatCoded, formatStated } from '../../values/value-text.ts';
import type { SheetView } from '../view.ts';
import { LogSlider } from './LogSlider.tsx';
import { ValueField } from './ValueField.tsx';

const offeredSeries: readonly SeriesName[] = ['E12', 'E24', 'E96'];
const usualTolerances = [0, 0.001, 0.005, 0.01, 0.02, 0.05, 0.1, 0.2];

interface ValueStripProps {
  readonly desk: Desk;
  readonly view: SheetView;
  /** Id. */
  readonly part: string;
  readonly onClose: () => void;
}

/** The strip of a part's value; closed where the part, or its value, goes. */
export function ValueStrip({ desk, view, part, onClose }: ValueStripProps): ReactElement | null {
  const document = useStore(desk.store, ({ history }) => history.document);
  const state = useStore(desk.store, (now) => now.state);
  const value = mainValueOf(document, state, part);
  const name = document.parts[part]?.name ?? part;
  const gone = value === undefined;
  useEffect(() => {
    if (gone) onClose();
  }, [gone, onClose]);
  return gone ? null : <OpenStrip desk={desk} view={view} value={value} of={name} onClose={onClose} />;
}

interface OpenStripProps extends Omit<ValueStripProps, 'part'> {
  readonly value: PartValue;
  /** The part's name. */
  readonly of: string;
}

/** One value under the hand: field, slider, stocked values, tolerance. */
function OpenStrip({ desk, view, value, of, onClose }: OpenStripProps): ReactElement {
  const stock = useStore(desk.store, (now) => now.stock);
  const { part, quantity } = value;
  const hold = useCallback((refused: boolean) => view.holdStrip(refused), [view]);
  // The field follows the slider by reference. Once a drag ends it says again what is stated.
  const follow = useCallback(
    (listener: (text: string) => void) =>
      desk.onLive((frame) => {
        if (frame?.part === part) listener(formatCoded(frame.value, quantity));
        if (frame !== null) return;
        const stated = mainValueOf(desk.document, desk.store.getState().state, part);
        if (stated !== undefined) listener(formatStated(stated.spec, stated.quantity));
      }),
    [desk, part, quantity],
  );
  const { key, label, spec, resolved } = value;
  const sign = Math.sign(resolved.nominal);
  const name = `${label} of ${of}`;
  const commit = (magnitude: number) =>
    desk.commitLive(value, withPlain(spec, formatCoded(sign * magnitude, quantity)));
  const stated = (text: string): Result<undefined> => desk.commitLive(value, withPlain(spec, text));
  const press = (event: KeyboardEvent) => {
    if (event.key !== 'Escape') return;
    event.stopPropagation();
    onClose();
  };

  return (
    <div className="value-strip" role="group" aria-label={name} onKeyDown={press}>
      <div className="strip-row">
        <ValueField
          // A fault belongs to the value at which it was typed.
          key={`${part} ${key}`}
          label={label}
          unit={quantityOf(quantity).unit}
          text={formatStated(spec, quantity)}
          follow={follow}
          onState={stated}
          onRefused={hold}
        />
        <Choice
          name="values"
          options={['free', 'stocked']}
          chosen={stock.stocked ? 'stocked' : 'free'}
          onChoose={(chosen) => desk.setStock({ ...stock, stocked: chosen === 'stocked' })}
        />
        <select
          aria-label="series"
          value={stock.series}
          disabled={!stock.stocked}
          onChange={(event) => desk.setStock({ ...stock, series: event.target.value as SeriesName })}
        >
          {offeredSeries.map((series) => (
            <option key={series}>{series}</option>
          ))}
        </select>
        <Tolerance
          value={value}
          onChoose={(fraction) => desk.commitLive(value, withTolerance(spec, fraction))}
        />
      </div>
      {sign === 0 ? (
        <p className="no-slider">A value of nought has no decades about it: type another in the field.</p>
      ) : (
        <LogSlider
          key={`${part} ${key}`}
          label={name}
          quantity={quantity}
          value={Math.abs(resolved.nominal)}
          stock={stock}
          onLive={(magnitude) => desk.setLive(part, key, sign * magnitude)}
          onCommit={commit}
          onCancel={() => desk.cancelLive()}
        />
      )}
    </div>
  );
}

interface ToleranceProps {
  readonly value: PartValue;
  readonly onChoose: (fraction: number) => Result<undefined>;
}

/** The usual tolerances, and the one that is stated. Limits stated as figures are shown as such, and left alone. */
function Tolerance({ value: { spec, resolved }, onChoose }: ToleranceProps): ReactElement {
  const byLimits = typeof spec === 'object' && !('tolerance' in spec);
  const now = resolved.tolerance ?? 0;
  const offered = usualTolerances.includes(now)
    ? usualTolerances
    : [...usualTolerances, now].sort((a, b) => a - b);
  return (
    <select
      aria-label="tolerance"
      value={byLimits ? 'limits' : now}
      onChange={(event) => onChoose(Number(event.target.value))}
    >
      {byLimits && <option value="limits">limits</option>}
      {offered.map((fraction) => (
        <option key={fraction} value={fraction}>
          {fraction === 0 ? 'exact' : `± ${formatPercent(fraction)}`}
        </option>
      ))}
    </select>
  );
}

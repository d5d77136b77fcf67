import {
  useEffect,
  useMemo,
  useRef,
  useState,
  type KeyboardEvent,
  type PointerEvent,
  type ReactElement,
} from 'react';
import type { Stock } from '../../desk/desk.ts';
import type { QuantityName } from '../../values/quantities.ts';
import { formatCoded } from '../../values/value-text.ts';
import { allowedNear, axisAbout, namedOn, nextValue, placeOf, ticksOf, valueAt } from './scale.ts';

/** Length of the axis, and how far it is set in so that the pointer does not leave the strip, pixels. */
const length = 310;
const inset = 18;

interface LogSliderProps {
  readonly label: string;
  readonly quantity: QuantityName;
  /** Magnitude, SI. */
  readonly value: number;
  readonly stock: Stock;
  readonly onLive: (value: number) => void;
  readonly onCommit: (value: number) => void;
  readonly onCancel: () => void;
}

/**
 * A slider over two decades. While it is dragged it moves its own pointer and tells each value; React renders nothing
 * until it is let go.
 */
export function LogSlider(props: LogSliderProps): ReactElement {
  const { label, quantity, value, stock, onLive, onCommit, onCancel } = props;
  const slider = useRef<HTMLDivElement>(null);
  const pointer = useRef<SVGGElement>(null);
  /** The value under way, and the one that it began with. */
  const live = useRef<{ now: number; readonly from: number } | null>(null);
  // Centred anew when the value is set beyond the axis, and left where it is otherwise.
  const [centre, setCentre] = useState(value);
  const axis = useMemo(() => axisAbout(centre, quantity), [centre, quantity]);
  if (value < axis.low || value > axis.high) setCentre(value);
  const text = (of: number) => formatCoded(of, quantity);

  const show = (now: number) => {
    pointer.current?.setAttribute('transform', `translate(${inset + placeOf(axis, now) * length} 0)`);
    slider.current?.setAttribute('aria-valuenow', String(now));
    slider.current?.setAttribute('aria-valuetext', text(now));
  };
  // A drag that was given up, or a value that was refused, leaves the pointer where React does not know it to be.
  useEffect(() => {
    if (live.current === null) show(value);
  });

  const tell = (now: number) => {
    live.current ??= { now: value, from: value };
    if (now === live.current.now) return;
    live.current.now = now;
    show(now);
    onLive(now);
  };
  const end = () => {
    const ended = live.current;
    live.current = null;
    if (ended === null) return;
    if (ended.now === ended.from) onCancel();
    else onCommit(ended.now);
  };
  const giveUp = () => {
    if (live.current === null) return false;
    live.current = null;
    show(value);
    onCancel();
    return true;
  };

  const at = (event: PointerEvent) => {
    const left = slider.current?.getBoundingClientRect().left ?? 0;
    return allowedNear(axis, valueAt(axis, (event.clientX - left - inset) / length), stock);
  };
  const press = (event: PointerEvent) => {
    if (event.button !== 0) return;
    event.currentTarget.setPointerCapture(event.pointerId);
    live.current = { now: value, from: value };
    tell(at(event));
  };
  const move = (event: PointerEvent) => {
    if (event.currentTarget.hasPointerCapture(event.pointerId)) tell(at(event));
  };

  const key = (event: KeyboardEvent) => {
    const now = live.current?.now ?? value;
    const next = valueOfKey(event.key, now);
    if (next !== undefined) tell(next);
    else if (event.key !== 'Escape' || !giveUp()) return;
    event.preventDefault();
    event.stopPropagation();
  };
  const valueOfKey = (pressed: string, now: number): number | undefined => {
    switch (pressed) {
      case 'ArrowUp':
      case 'ArrowRight':
        return nextValue(axis, now, 'up', stock);
      case 'ArrowDown':
      case 'ArrowLeft':
        return nextValue(axis, now, 'down', stock);
      case 'PageUp':
        return allowedNear(axis, now * 2, stock);
      case 'PageDown':
        return allowedNear(axis, now / 2, stock);
      case 'Home':
        return allowedNear(axis, axis.low, stock);
      case 'End':
        return allowedNear(axis, axis.high, stock);
      default:
        return undefined;
    }
  };

  const x = (of: number) => inset + of * length;
  return (
    <div
      ref={slider}
      className="log-slider"
      role="slider"
      tabIndex={0}
      aria-label={label}
      aria-valuemin={axis.low}
      aria-valuemax={axis.high}
      aria-valuenow={value}
      aria-valuetext={text(value)}
      onPointerDown={press}
      onPointerMove={move}
      onPointerUp={end}
      onPointerCancel={giveUp}
      onKeyDown={key}
      onKeyUp={end}
      onBlur={end}
    >
      <svg width={length + 2 * inset} height={52} aria-hidden="true">
        <path className="axis" d={`M${inset} 22H${inset + length}`} />
        {ticksOf(axis).map((tick) => (
          <path key={tick.at} className="tick" d={`M${x(tick.at)} 22v${tick.length}`} />
        ))}
        {namedOn(axis).map((named) => (
          <text key={named} x={x(placeOf(axis, named))} y={48}>
            {text(named)}
          </text>
        ))}
        <g ref={pointer} className="pointer" transform={`translate(${x(placeOf(axis, value))} 0)`}>
          <path d="M-8 2.5H8V14L0 22.5L-8 14Z" />
          <path d="M-2.5 6.5V13M2.5 6.5V13" />
        </g>
      </svg>
    </div>
  );
}

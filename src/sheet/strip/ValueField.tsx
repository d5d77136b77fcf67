import { useEffect, useRef, useState, type KeyboardEvent, type ReactElement } from 'react';
import { prepareArithmetic } from '../../values/arithmetic.ts';
import type { Fault, Result } from '../../values/result.ts';

interface ValueFieldProps {
  readonly label: string;
  readonly unit: string;
  /** As it is stated. */
  readonly text: string;
  /** Tells the value while it is dragged, as text; the call it returns ends that. */
  readonly follow: (listener: (text: string) => void) => () => void;
  readonly onState: (text: string) => Result<undefined>;
  /** Whether what stands in the field was refused. */
  readonly onRefused: (refused: boolean) => void;
}

/** A value as text. What does not parse stays as it was typed, with the reason and the forms that are accepted. */
export function ValueField(props: ValueFieldProps): ReactElement {
  const { label, unit, text, follow, onState, onRefused } = props;
  const field = useRef<HTMLInputElement>(null);
  /** A fault lasts until something is stated, here or elsewhere. */
  const [refusal, setRefusal] = useState<{ readonly fault: Fault; readonly text: string } | undefined>();
  const fault = refusal?.text === text ? refusal.fault : undefined;
  useEffect(() => {
    // Arithmetic is loaded when a field is first there to take it.
    void prepareArithmetic();
  }, []);
  useEffect(() => {
    // The field is its own while it is typed in; a value that was stated, here or elsewhere, is put into it.
    if (field.current !== null) field.current.value = text;
  }, [text]);
  useEffect(
    () =>
      follow((dragged) => {
        if (field.current !== null) field.current.value = dragged;
      }),
    [follow],
  );
  useEffect(() => field.current?.focus({ preventScroll: true }), []);
  useEffect(() => onRefused(fault !== undefined), [onRefused, fault]);

  const state = (typed: string) => {
    const result = typed.trim() === text ? undefined : onState(typed.trim());
    const [first] = result === undefined || result.ok ? [] : result.faults;
    setRefusal(first === undefined ? undefined : { fault: first, text });
    onRefused(first !== undefined);
  };
  const press = (event: KeyboardEvent<HTMLInputElement>) => {
    if (event.key === 'Enter') state(event.currentTarget.value);
    // Left by Escape, a field states nothing.
    if (event.key === 'Escape') event.currentTarget.value = text;
  };
  return (
    <>
      <span className="value-field">
        <input
          ref={field}
          type="text"
          defaultValue={text}
          spellCheck={false}
          autoComplete="off"
          aria-label={label}
          aria-invalid={fault !== undefined}
          aria-describedby={fault === undefined ? undefined : 'value-fault'}
          onFocus={(event) => event.currentTarget.select()}
          onBlur={(event) => state(event.currentTarget.value)}
          onKeyDown={press}
        />
        <span aria-hidden="true">{unit}</span>
      </span>
      {fault !== undefined && (
        <p id="value-fault" className="fault" role="alert">
          {fault.message}
          {fault.allowed !== undefined && <> Accepted: {fault.allowed}.</>}
        </p>
      )}
    </>
  );
}

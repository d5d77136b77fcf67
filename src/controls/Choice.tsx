import type { ReactElement } from 'react';

interface ChoiceProps<Option extends string> {
  readonly name: string;
  readonly options: readonly Option[];
  readonly chosen: Option;
  readonly onChoose: (option: Option) => void;
  /** The state of the equipment alone is filled; every other choice carries a bar under its word. */
  readonly filled?: boolean;
}

/** One of a few words, side by side: radio buttons, so that arrow keys and screen readers know them. */
export function Choice<Option extends string>(props: ChoiceProps<Option>): ReactElement {
  const { name, options, chosen, onChoose, filled = false } = props;
  return (
    <fieldset className={filled ? 'choice filled' : 'choice'}>
      <legend>{name}</legend>
      <div className="choice-options">
        {options.map((option) => (
          <label key={option}>
            <input type="radio" name={name} checked={option === chosen} onChange={() => onChoose(option)} />
            <span>{option}</span>
          </label>
        ))}
      </div>
    </fieldset>
  );
}

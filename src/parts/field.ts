/** What a form needs to know of one entry of a part's `values`. */

/** A number with a unit, as typed. `quantity` is the name by which src/values reads and ranges it. */
export interface QuantityField {
  readonly form: 'quantity';
  readonly key: string;
  readonly label: string;
  readonly quantity: string;
  readonly optional: boolean;
  /** What holds where nothing is stated, SI. */
  readonly fallback?: number;
  /** Whether a tolerance or low and high may be stated. */
  readonly spread: boolean;
}

export interface ChoiceField {
  readonly form: 'choice';
  readonly key: string;
  readonly label: string;
  readonly choices: readonly { readonly value: string; readonly label: string }[];
  readonly optional: boolean;
  readonly fallback?: string;
}

export interface YesNoField {
  readonly form: 'yes-no';
  readonly key: string;
  readonly label: string;
  readonly optional: boolean;
}

export interface TextField {
  readonly form: 'text';
  readonly key: string;
  readonly label: string;
  readonly optional: boolean;
}

export type Field = QuantityField | ChoiceField | YesNoField | TextField;

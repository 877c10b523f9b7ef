/** What a form's action gives back to its form. */
export interface FormState {
  /** What went wrong, for the whole form. */
  error: string | null;
  /** What is wrong with single fields, by field name. */
  errors: Record<string, string>;
  /** What was typed, to fill the form with again; never secrets. */
  values: Record<string, string>;
  /** What was done. */
  done: string | null;
  /** Values that only the answer carries, such as the secret of a new token. */
  data: Record<string, string>;
}

export const untouchedForm: FormState = { error: null, errors: {}, values: {}, done: null, data: {} };

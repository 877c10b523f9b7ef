import { type FormState } from '@/lib/access/form-state';

/** What came of a form. Both regions stand there empty from the start, so that screen readers say what comes into them. */
export function FormMessage({ state }: { state: FormState }) {
  return (
    <div>
      <div role="alert">{state.error && <p className="mt-1 rounded-sm bg-madder-wash px-3 py-2 text-madder">{state.error}</p>}</div>
      <div role="status">{state.done && <p className="mt-1 rounded-sm bg-verdigris-wash px-3 py-2 text-verdigris">{state.done}</p>}</div>
    </div>
  );
}

import { type FormState } from '@/lib/access/form-state';

/** What came of a form: said aloud by screen readers, and empty until there is something to say. */
export function FormMessage({ state }: { state: FormState }) {
  return (
    <>
      <div role="alert">{state.error && <p className="rounded-sm bg-madder-wash px-3 py-2 text-madder">{state.error}</p>}</div>
      <div role="status">{state.done && <p className="rounded-sm bg-verdigris-wash px-3 py-2 text-verdigris">{state.done}</p>}</div>
    </>
  );
}

import { type FormState } from '@/lib/access/form-state';

const shape = 'mt-1 border-l-[3px] px-3 py-2 text-[14px]';

/** What came of a form. Both regions stand there empty from the start, so that screen readers say what comes into them. */
export function FormMessage({ state }: { state: FormState }) {
  return (
    <div>
      <div role="alert">{state.error && <p className={`${shape} border-madder bg-madder-wash text-madder`}>{state.error}</p>}</div>
      <div role="status">{state.done && <p className={`${shape} border-verdigris bg-verdigris-wash text-verdigris`}>{state.done}</p>}</div>
    </div>
  );
}

import Form from 'next/form';
import { useId } from 'react';

import { Button } from '@/components/ui/button';
import { controlClass } from '@/components/ui/field';

/** A search whose words stand in the address. */
export function SearchForm({ label, q, hint }: { label: string; q: string | undefined; hint?: string }) {
  const id = useId();
  return (
    <Form action="" role="search" className="grid max-w-md gap-1">
      <label htmlFor={id} className="text-[13px] font-semibold">
        {label}
      </label>
      <div className="flex gap-2">
        <input id={id} key={q} name="q" type="search" defaultValue={q} maxLength={300} aria-describedby={hint ? `${id}-hint` : undefined} className={controlClass} />
        <Button type="submit">
          Search
        </Button>
      </div>
      {hint && (
        <p id={`${id}-hint`} className="text-[13px] text-ink-soft">
          {hint}
        </p>
      )}
    </Form>
  );
}

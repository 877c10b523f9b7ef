'use client';

import { useRouter } from 'next/navigation';
import { useRef, useState, type FormEvent } from 'react';

import { draftOf, ParameterFields, parametersOf } from '@/components/analyses/parameter-fields';
import { Button, ButtonLink } from '@/components/ui/button';
import { FormError } from '@/components/ui/field';
import { ApiProblem, messageOf, send } from '@/lib/api/client';
import { type AnalysisView } from '@/lib/api/types';
import { type AnalysisParameters } from '@/lib/network/types';

/** Asks for an analysis. Nothing typed is lost when the service refuses it. */
export function NewAnalysisForm({ portfolioId, initial }: { portfolioId: string; initial: AnalysisParameters }) {
  const router = useRouter();
  const [draft, setDraft] = useState(() => draftOf(initial));
  const [problem, setProblem] = useState<{ message: string; errors: Record<string, string> } | null>(null);
  const [sending, setSending] = useState(false);
  const form = useRef<HTMLFormElement>(null);

  const submit = async (event: FormEvent) => {
    event.preventDefault();
    setSending(true);
    try {
      const analysis = await send<AnalysisView>('POST', `/api/portfolios/${portfolioId}/analyses`, { parameters: parametersOf(draft) });
      router.push(`/portfolios/${portfolioId}/analyses/${analysis.id}`);
    } catch (error) {
      const errors = error instanceof ApiProblem ? error.errors : {};
      setProblem({ message: Object.keys(errors).length > 0 ? 'Nothing was started. Mend the marked fields and try again.' : messageOf(error), errors });
      setSending(false);
      // After React has marked the fields.
      requestAnimationFrame(() => form.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus());
    }
  };
  return (
    <form ref={form} noValidate onSubmit={(event) => void submit(event)} className="grid max-w-[52rem] gap-8">
      <ParameterFields draft={draft} errors={problem?.errors ?? {}} onChange={(name, value) => setDraft((current) => ({ ...current, [name]: value }))} />
      {problem && <FormError>{problem.message}</FormError>}
      <div className="flex flex-wrap gap-2">
        <Button type="submit" kind="primary" disabled={sending}>{sending ? 'Starting…' : 'Start the analysis'}</Button>
        <ButtonLink kind="quiet" href={`/portfolios/${portfolioId}/analyses`}>Back to analyses</ButtonLink>
      </div>
    </form>
  );
}

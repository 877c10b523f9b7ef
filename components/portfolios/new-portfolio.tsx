'use client';

import { useRouter } from 'next/navigation';
import { useState, type FormEvent } from 'react';

import { PeopleField, type NamedPerson } from '@/components/portfolios/people-field';
import { draftBody, emptyDraft, PortfolioFields, type PortfolioDraft } from '@/components/portfolios/portfolio-fields';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { FormError } from '@/components/ui/field';
import { Icon } from '@/components/ui/icons';
import { ApiProblem, formMessage, messageOf, send } from '@/lib/api/client';
import { type PortfolioView, type UnitView } from '@/lib/api/types';

/** The button and the form behind it. What was typed stays when the dialog is closed or the service refuses. */
export function NewPortfolio({ units }: { units: (UnitView & { depth: number })[] }) {
  const router = useRouter();
  const [open, setOpen] = useState(false);
  const [draft, setDraft] = useState<PortfolioDraft>(emptyDraft);
  const [people, setPeople] = useState<NamedPerson[]>([]);
  const [problem, setProblem] = useState<ApiProblem | string | null>(null);
  const [sending, setSending] = useState(false);
  const errors = problem instanceof ApiProblem ? problem.errors : {};

  const submit = async (event: FormEvent) => {
    event.preventDefault();
    setSending(true);
    setProblem(null);
    try {
      const made = await send<PortfolioView>('POST', '/api/portfolios', { ...draftBody(draft), grants: people.map(({ userId, level }) => ({ userId, level })) });
      router.push(`/portfolios/${made.id}`);
    } catch (error) {
      setProblem(error instanceof ApiProblem ? error : messageOf(error));
      setSending(false);
    }
  };

  return (
    <>
      <Button kind="primary" onClick={() => setOpen(true)}>
        <Icon name="plus" /> New portfolio
      </Button>
      <Dialog open={open} onOpenChange={setOpen} title="New portfolio" description="A set of works of a unit, a project or a question. You manage it; give it to others now or later.">
        <form onSubmit={submit} className="grid gap-4" noValidate>
          {problem && <FormError>{formMessage(problem)}</FormError>}
          <PortfolioFields draft={draft} onChange={setDraft} errors={errors} units={units} />
          <PeopleField people={people} onChange={setPeople} error={Object.entries(errors).find(([field]) => field.startsWith('grants'))?.[1]} />
          <div className="flex justify-end gap-2">
            <Button kind="quiet" onClick={() => setOpen(false)}>Cancel</Button>
            <Button kind="primary" type="submit" disabled={sending}>{sending ? 'Making it' : 'Make portfolio'}</Button>
          </div>
        </form>
      </Dialog>
    </>
  );
}

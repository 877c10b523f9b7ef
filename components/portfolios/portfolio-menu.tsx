'use client';

import { useRouter } from 'next/navigation';
import { useState, type FormEvent } from 'react';

import { PeopleField, type NamedPerson } from '@/components/portfolios/people-field';
import { draftBody, PortfolioFields, type PortfolioDraft } from '@/components/portfolios/portfolio-fields';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { FormError } from '@/components/ui/field';
import { Menu, MenuItem, MenuSeparator } from '@/components/ui/menu';
import { ApiProblem, formMessage, messageOf, send } from '@/lib/api/client';
import { type PortfolioDetail, type UnitView } from '@/lib/api/types';

interface PortfolioMenuProps {
  portfolio: PortfolioDetail;
  units: (UnitView & { depth: number })[];
  onChanged: () => void;
}

const draftOf = (portfolio: PortfolioDetail): PortfolioDraft => ({
  name: portfolio.name,
  description: portfolio.description,
  unitId: portfolio.unit?.id ?? '',
  periodFrom: portfolio.periodFrom === null ? '' : String(portfolio.periodFrom),
  periodTo: portfolio.periodTo === null ? '' : String(portfolio.periodTo),
});

/** What those who manage a portfolio do with it: describe it, give it to people, delete it (which can be undone). */
export function PortfolioMenu({ portfolio, units, onChanged }: PortfolioMenuProps) {
  const router = useRouter();
  const [open, setOpen] = useState<'details' | 'people' | null>(null);
  const [draft, setDraft] = useState(() => draftOf(portfolio));
  const [people, setPeople] = useState<NamedPerson[]>(portfolio.grants ?? []);
  const [problem, setProblem] = useState<ApiProblem | string | null>(null);
  const [sending, setSending] = useState(false);
  const errors = problem instanceof ApiProblem ? problem.errors : {};

  const begin = (what: 'details' | 'people') => {
    setDraft(draftOf(portfolio));
    setPeople(portfolio.grants ?? []);
    setProblem(null);
    setOpen(what);
  };
  const attempt = async (work: () => Promise<unknown>, done: () => void) => {
    setSending(true);
    setProblem(null);
    try {
      await work();
      done();
    } catch (error) {
      setProblem(error instanceof ApiProblem ? error : messageOf(error));
    } finally {
      setSending(false);
    }
  };
  const saved = () => {
    setOpen(null);
    onChanged();
    // The name stands in the frame around this page too.
    router.refresh();
  };
  const saveDetails = (event: FormEvent) => {
    event.preventDefault();
    void attempt(() => send('PATCH', `/api/portfolios/${portfolio.id}`, draftBody(draft)), saved);
  };
  const savePeople = (event: FormEvent) => {
    event.preventDefault();
    void attempt(() => send('PUT', `/api/portfolios/${portfolio.id}/grants`, { grants: people.map(({ userId, level }) => ({ userId, level })) }), saved);
  };
  const remove = () => void attempt(() => send('DELETE', `/api/portfolios/${portfolio.id}`), () => router.push(`/portfolios?deleted=${portfolio.id}`));
  const message = problem && <FormError>{formMessage(problem)}</FormError>;
  const buttons = (
    <div className="flex justify-end gap-2">
      <Button kind="quiet" onClick={() => setOpen(null)}>Cancel</Button>
      <Button kind="primary" type="submit" disabled={sending}>{sending ? 'Saving' : 'Save'}</Button>
    </div>
  );

  return (
    <>
      <Menu label="Manage this portfolio" trigger={<Button>Manage</Button>}>
        <MenuItem onSelect={() => begin('details')}>Name, unit and period</MenuItem>
        <MenuItem onSelect={() => begin('people')}>People</MenuItem>
        <MenuSeparator />
        <MenuItem onSelect={remove}>Delete (can be undone)</MenuItem>
      </Menu>
      {open === null && message}
      <Dialog open={open === 'details'} onOpenChange={(stays) => setOpen(stays ? 'details' : null)} title="Name, unit and period">
        <form onSubmit={saveDetails} className="grid gap-4" noValidate>
          {message}
          <PortfolioFields draft={draft} onChange={setDraft} errors={errors} units={units} />
          {buttons}
        </form>
      </Dialog>
      <Dialog open={open === 'people'} onOpenChange={(stays) => setOpen(stays ? 'people' : null)} title="People" description="Who holds this portfolio. Administrators see every portfolio.">
        <form onSubmit={savePeople} className="grid gap-4" noValidate>
          {message}
          <PeopleField people={people} onChange={setPeople} error={Object.entries(errors).find(([field]) => field.startsWith('grants.'))?.[1]} />
          {buttons}
        </form>
      </Dialog>
    </>
  );
}

'use client';

import { useState } from 'react';

import { Button, ButtonLink, IconButton } from '@/components/ui/button';
import { Dialog, Sheet } from '@/components/ui/dialog';
import { Checkbox, FormError, RadioGroup, SelectField, TextArea, TextField } from '@/components/ui/field';
import { FormErrorSummary } from '@/components/ui/form-errors';
import { Icon, type IconName } from '@/components/ui/icons';
import { KeyHint } from '@/components/ui/key-hint';
import { Menu, MenuCheckbox, MenuItem, MenuLabel, MenuSeparator } from '@/components/ui/menu';
import { PageHeader } from '@/components/ui/page-header';
import { Cell, ColumnHead, RowHead, Table, TableBody, TableHead } from '@/components/ui/table';
import { useToast } from '@/components/ui/toast';
import { Tooltip } from '@/components/ui/tooltip';

const icons: IconName[] = ['plus', 'minus', 'home', 'list', 'search', 'close', 'left', 'right', 'up', 'down', 'sort', 'download', 'upload', 'check', 'warning', 'person', 'pin', 'columns', 'undo', 'link', 'light', 'dark'];

export function ControlExamples() {
  const toast = useToast();
  const [open, setOpen] = useState<'dialog' | 'sheet' | null>(null);
  const [basis, setBasis] = useState<'coupling' | 'cocitation'>('coupling');
  const [retracted, setRetracted] = useState(true);
  const [faults, setFaults] = useState(false);
  return (
    <section aria-label="Controls" className="grid gap-5">
      <PageHeader title="Controls" />
      <div className="flex flex-wrap items-center gap-2">
        <Button kind="primary" aria-keyshortcuts="S">Same work <KeyHint>S</KeyHint></Button>
        <Button>Different</Button>
        <Button kind="quiet">Undo</Button>
        <Button kind="destructive">Delete for good</Button>
        <Button kind="primary" disabled>Accept 2,276 now</Button>
        <ButtonLink href="/components">As a link</ButtonLink>
        <Tooltip text="Puts the map back to its first view"><Button>With a tip</Button></Tooltip>
      </div>
      <div className="flex flex-wrap gap-2">{icons.map((name) => <IconButton key={name} label={`Sign ${name}`}><Icon name={name} /></IconButton>)}</div>
      <div className="flex flex-wrap gap-2">
        <Button onClick={() => setOpen('dialog')}>Open a dialog</Button>
        <Button onClick={() => setOpen('sheet')}>Open a sheet</Button>
        <Button onClick={() => toast({ text: 'Import undone', undo: () => toast({ text: 'Import accepted again' }) })}>Show a toast</Button>
        <Menu label="Example" trigger={<Button>Open a menu</Button>} align="start">
          <MenuLabel>Show</MenuLabel>
          <MenuCheckbox checked={retracted} onCheckedChange={setRetracted}>Retracted works</MenuCheckbox>
          <MenuSeparator />
          <MenuItem onSelect={() => toast({ text: 'Merged' })}>Merge</MenuItem>
        </Menu>
      </div>
      <form
        noValidate
        className="grid max-w-md gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          setFaults(true);
        }}
      >
        <FormErrorSummary faults={faults ? [{ fieldId: 'example-year', message: 'The period ends before it begins' }] : []} />
        <TextField label="Name" hint="As the unit calls itself" defaultValue="Freshwater Ecology 2016–2025" />
        <SelectField label="Unit"><option>Freshwater Ecology</option><option>Peat and Soil Science</option></SelectField>
        <TextField id="example-year" label="To" error="The period ends before it begins" defaultValue="1998" inputMode="numeric" />
        <TextArea label="Purpose" placeholder="What this portfolio is for" />
        <Checkbox label="Count same-author citations" hint="They stay visible in the evidence either way" defaultChecked />
        <RadioGroup legend="Clusters" name="basis" value={basis} onChange={setBasis} options={[{ value: 'coupling', label: 'By shared references' }, { value: 'cocitation', label: 'By being cited together', hint: 'Recent works have had no time to be cited' }]} />
        <FormError>The service could not be reached. What you typed is kept.</FormError>
        <div className="flex gap-2"><Button kind="primary" type="submit">Save</Button><Button kind="quiet">Cancel</Button></div>
      </form>
      <Table caption="People who hold this portfolio">
        <TableHead><ColumnHead>Name</ColumnHead><ColumnHead>May</ColumnHead><ColumnHead numeric>Since</ColumnHead></TableHead>
        <TableBody>
          <tr><RowHead>Maren Oduya</RowHead><Cell>manage</Cell><Cell numeric>2024</Cell></tr>
          <tr><RowHead>Pekka Lindqvist</RowHead><Cell>view</Cell><Cell numeric>2025</Cell></tr>
        </TableBody>
      </Table>
      <Dialog open={open === 'dialog'} onOpenChange={() => setOpen(null)} title="Delete the report for good?" description="The report and its share links will be gone. The analyses stay.">
        <div className="flex justify-end gap-2"><Button kind="quiet" onClick={() => setOpen(null)}>Keep it</Button><Button kind="destructive" onClick={() => setOpen(null)}>Delete the report</Button></div>
      </Dialog>
      <Sheet open={open === 'sheet'} onOpenChange={() => setOpen(null)} title="Run an analysis" description="It runs in the background; you can leave.">
        <TextField label="Name" />
      </Sheet>
    </section>
  );
}

'use client';

import { RadioGroup, SelectField, TextField } from '@/components/ui/field';
import { defaultParameters, type AnalysisParameters } from '@/lib/network/types';

/** The fields as typed; they become numbers when the form is sent. */
export type ParameterDraft = { [Name in keyof AnalysisParameters]: string };

export const draftOf = (parameters: AnalysisParameters): ParameterDraft =>
  Object.fromEntries(Object.entries(parameters).map(([name, value]) => [name, value === null ? '' : String(value)])) as ParameterDraft;

const texts = new Set<keyof AnalysisParameters>(['scope', 'similarity', 'clustering']);
const nullable = new Set<keyof AnalysisParameters>(['periodFrom', 'periodTo']);

/** What the API is sent. Fields that are no numbers go as they were typed, so that the answer names them. */
export function parametersOf(draft: ParameterDraft): Record<string, unknown> {
  return Object.fromEntries(
    Object.entries(draft).map(([name, text]) => {
      const key = name as keyof AnalysisParameters;
      if (texts.has(key)) return [name, text];
      if (text.trim() === '') return [name, nullable.has(key) ? null : defaultParameters[key]];
      const value = Number(text.trim().replace(',', '.'));
      return [name, Number.isFinite(value) ? value : text];
    }),
  );
}

interface ParameterFieldsProps {
  draft: ParameterDraft;
  errors: Record<string, string>;
  onChange: (name: keyof AnalysisParameters, value: string) => void;
}

const legend = 'mb-2 w-full border-b border-ink pb-2 font-serif text-panel font-medium';

/** Every parameter of an analysis, each with what it does and a reason for its default. */
export function ParameterFields({ draft, errors, onChange }: ParameterFieldsProps) {
  const field = (name: keyof AnalysisParameters) => ({ name, value: draft[name], error: errors[`parameters.${name}`], onChange: (event: { target: { value: string } }) => onChange(name, event.target.value) });
  const number = (name: keyof AnalysisParameters) => ({ ...field(name), inputMode: 'decimal' as const, autoComplete: 'off' });
  return (
    <>
      <fieldset className="grid gap-4">
        <legend className={legend}>What takes part</legend>
        <RadioGroup
          legend="Works"
          name="scope"
          value={draft.scope as AnalysisParameters['scope']}
          onChange={(value) => onChange('scope', value)}
          options={[
            { value: 'with-cited', label: 'The works of the portfolio and what they cite', hint: 'Shows what the portfolio rests on, also where it was not catalogued.' },
            { value: 'catalogued', label: 'The works of the portfolio only', hint: 'Shows how they cite each other.' },
          ]}
        />
        {draft.scope === 'with-cited' && <TextField label="Least citations of a cited-only work" hint="Works cited less often stay outside. Lower shows more, and more chance." className="max-w-80" {...number('minimumCitations')} />}
        <div className="grid max-w-[30rem] grid-cols-2 gap-4">
          <TextField label="Citing works from year" placeholder="open" {...number('periodFrom')} />
          <TextField label="to year" placeholder="open" {...number('periodTo')} />
        </div>
      </fieldset>
      <fieldset className="grid gap-4 sm:grid-cols-2">
        <legend className={legend}>Ranks</legend>
        <TextField label="Damping of PageRank" hint="Chance that a reader follows one more reference. 0.5: readers of scholarly works follow about two references (Chen et al. 2007). 0.85 favours old works and pairs that cite each other; it is always shown beside." {...number('damping')} />
        <TextField label="Resamples for rank intervals" hint="Citing works are drawn anew this many times; intervals hold 95% of the ranks. 0 leaves intervals out." {...number('replicates')} />
      </fieldset>
      <fieldset className="grid gap-4 sm:grid-cols-2">
        <legend className={legend}>Clusters and maps</legend>
        <SelectField label="Similarity" hint="Association strength sets shared citations against what chance would give." {...field('similarity')}>
          <option value="association-strength">Association strength</option>
          <option value="cosine">Cosine</option>
          <option value="jaccard">Jaccard</option>
        </SelectField>
        <SelectField label="Method" hint="Leiden keeps every cluster in one piece; Louvain is there for comparison." {...field('clustering')}>
          <option value="leiden">Leiden</option>
          <option value="louvain">Louvain</option>
        </SelectField>
        <TextField label="Resolution" hint="Above 1: more and smaller clusters. Below 1: fewer and larger ones." {...number('resolution')} />
        <TextField label="Repeats" hint="Seeds tried on each basis; the best partition is kept, the others tell how firm it is." {...number('repeats')} />
        <TextField label="Longest reference list" hint="Works with longer ones are left out when pairs are counted, so that a few reviews do not own the map." {...number('maximumReferences')} />
        <TextField label="Seed" hint="The same seed on the same input gives the same result, byte for byte." {...number('seed')} />
      </fieldset>
    </>
  );
}

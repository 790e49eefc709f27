import { use } from 'react';
import { LIMITS } from '../../../../shared/limits.ts';
import { confidences } from '../../../../shared/materialSource.ts';
import type { ReactNode } from 'react';
import { IssueContext } from '../hooks/issueContext.ts';
import type { SourceForm } from '../model/form.ts';
import { ChoiceField } from './ChoiceField.tsx';
import { TextField } from './TextField.tsx';

type Props = {
  /** What comes from there: "n and k". */
  of: string;
  path: string;
  source: SourceForm;
  /** Stands beside the heading, such as the way to take over another source. */
  action?: ReactNode;
  onChange: (source: SourceForm) => void;
};

const confidenceOptions = confidences.map((value) => ({ value, label: value }));

const further = [
  { field: 'doi', label: 'DOI', placeholder: 'such as 10.1103/PhysRevB.9.5056' },
  { field: 'sample', label: 'Sample', placeholder: 'such as film, 40 nm, on glass, evaporated' },
  { field: 'temperature', label: 'Temperature', placeholder: 'such as 295 K' },
  { field: 'method', label: 'Method', placeholder: 'such as ellipsometry' },
  { field: 'licence', label: 'Licence', placeholder: 'such as CC BY 4.0' },
  { field: 'caution', label: 'Caution', placeholder: 'what a reader must know before use, in a sentence' },
] as const;

/** Where constants come from. It travels with every run, share link and export. */
export function SourceFields({ of, path, source, action, onChange }: Props) {
  const issues = use(IssueContext);
  const filled = further.filter(({ field }) => source[field] !== '').map(({ label }) => label.toLowerCase());
  const wrong = further.some(({ field }) => issues.some((issue) => issue.path === `${path}.${field}`));
  return (
    <fieldset className="flex flex-col gap-3 border-t border-line pt-3">
      <legend className="sr-only">Where {of} come from</legend>
      <div className="flex flex-wrap items-center justify-between gap-2">
        <span aria-hidden="true" className="font-semibold">
          Where {of} come from
        </span>
        {action}
      </div>
      <TextField
        label="Citation (required)"
        path={`${path}.citation`}
        value={source.citation}
        lines={2}
        maxLength={LIMITS.noteLength}
        placeholder="Authors, journal, volume, page (year); or whose measurement, when"
        onChange={(citation) => onChange({ ...source, citation })}
      />
      <ChoiceField
        label="Confidence"
        path={`${path}.confidence`}
        value={source.confidence}
        options={confidenceOptions}
        className="w-56"
        onChange={(confidence) => onChange({ ...source, confidence })}
      />
      <details open={wrong || undefined}>
        <summary className="w-fit text-accent">
          DOI, sample, temperature, method, licence, caution
          <span className="text-muted">{filled.length > 0 ? ` (given: ${filled.join(', ')})` : ''}</span>
        </summary>
        <div className="mt-2 grid gap-3 sm:grid-cols-2">
          {further.map(({ field, label, placeholder }) => (
            <TextField
              key={field}
              label={label}
              path={`${path}.${field}`}
              value={source[field]}
              maxLength={LIMITS.noteLength}
              placeholder={placeholder}
              onChange={(text) => onChange({ ...source, [field]: text })}
            />
          ))}
        </div>
      </details>
    </fieldset>
  );
}

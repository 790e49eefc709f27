import type { ReactNode } from 'react';
import type { MaterialSummary } from '../../../../shared/material.ts';
import type { EditContent } from '../hooks/useMaterialEditor.ts';
import { blankIndex, rangeOfForm } from '../model/blankForm.ts';
import type { ContentForm, IndexForm } from '../model/form.ts';
import { isField } from '../model/isField.ts';
import { ImportedNote } from './ImportedNote.tsx';
import { KindField } from './KindField.tsx';
import { MixtureFields } from './MixtureFields.tsx';
import { PlainIndexFields } from './PlainIndexFields.tsx';
import { Section } from './Section.tsx';
import { SectionIssues } from './SectionIssues.tsx';
import { SourceFields } from './SourceFields.tsx';
import { TensorFields } from './TensorFields.tsx';

export const plainIndexOptions = [
  { value: 'table' as const, label: 'a table' },
  { value: 'sellmeier' as const, label: 'a Sellmeier formula' },
  { value: 'cauchy' as const, label: 'a Cauchy formula' },
  { value: 'oscillators' as const, label: 'a sum of oscillators' },
  { value: 'formula' as const, label: 'a formula of your own' },
];

const options = [
  ...plainIndexOptions,
  { value: 'mixture of' as const, label: 'a mixture of two materials' },
  { value: 'tensor' as const, label: 'a free permittivity tensor' },
];

type Props = {
  content: ContentForm;
  materials: readonly MaterialSummary[];
  /** The fit of the model in the form, where it can be fitted. */
  fit: ReactNode;
  onChange: EditContent;
};

/** How n and k are given, the numbers themselves, and where they come from. */
export function IndexSection({ content, materials, fit, onChange }: Props) {
  const { index, indexSource } = content;
  return (
    <Section title="Refractive index N = n + ik">
      <KindField<IndexForm>
        label="n and k are given by"
        form={index}
        options={index.kind === 'import' ? [...options, importOption] : options}
        make={(kind) => (kind === 'import' ? index : blankIndex(kind, rangeOfForm(index)))}
        onChange={(next) => onChange({ index: next })}
      />
      <IndexFields index={index} materials={materials} onChange={(next) => onChange({ index: next })} />
      <SectionIssues path="index" isField={(path) => isField(content, path)} />
      {fit}
      <SourceFields
        of="n and k"
        path="indexSource"
        source={indexSource}
        onChange={(source) => onChange({ indexSource: source })}
      />
    </Section>
  );
}

const importOption = { value: 'import' as const, label: 'the imported file' };

type FieldsProps = {
  index: IndexForm;
  materials: readonly MaterialSummary[];
  onChange: (index: IndexForm) => void;
};

function IndexFields({ index, materials, onChange }: FieldsProps) {
  switch (index.kind) {
    case 'tensor':
      return <TensorFields form={index} onChange={onChange} />;
    case 'mixture of':
      return <MixtureFields form={index} materials={materials} onChange={onChange} />;
    case 'import':
      return <ImportedNote form={index} />;
    case 'table':
    case 'sellmeier':
    case 'cauchy':
    case 'oscillators':
    case 'formula':
      return <PlainIndexFields form={index} path="index" name="n and k" onChange={onChange} />;
  }
}

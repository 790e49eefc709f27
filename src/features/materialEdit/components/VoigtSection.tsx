import type { ReactNode } from 'react';
import { Button } from '../../../components/Button.tsx';
import type { EditContent } from '../hooks/useMaterialEditor.ts';
import { blankVoigt, rangeOfForm } from '../model/blankForm.ts';
import type { ContentForm, VoigtForm } from '../model/form.ts';
import { isField } from '../model/isField.ts';
import { voigtCellPath } from '../model/tableCells.ts';
import { VoigtFormulaFields } from './FormulaFields.tsx';
import { ImportedNote } from './ImportedNote.tsx';
import { KindField } from './KindField.tsx';
import { LinesFields } from './LinesFields.tsx';
import { RangeFields } from './RangeFields.tsx';
import { Section } from './Section.tsx';
import { SectionIssues } from './SectionIssues.tsx';
import { SourceFields } from './SourceFields.tsx';
import { TableGrid } from './TableGrid.tsx';

const options = [
  { value: 'none' as const, label: 'nothing: it is not magneto-optic' },
  { value: 'table' as const, label: 'a table' },
  { value: 'lines' as const, label: 'a sum of lines' },
  { value: 'formula' as const, label: 'a formula of your own' },
];

const mixtureOption = { value: 'mixture' as const, label: 'the parts of the mixture' };
const importOption = { value: 'import' as const, label: 'the imported file' };

type Props = { content: ContentForm; fit: ReactNode; onChange: EditContent };

/** How the Voigt constant is given, the numbers themselves, and where they come from. */
export function VoigtSection({ content, fit, onChange }: Props) {
  const { voigt, voigtSource, index, indexSource } = content;
  const change = (next: VoigtForm) => onChange({ voigt: next });
  const offered = [
    ...options,
    ...(index.kind === 'mixture of' || voigt.kind === 'mixture' ? [mixtureOption] : []),
    ...(voigt.kind === 'import' ? [importOption] : []),
  ];
  const start = voigt.kind === 'none' ? index : voigt;
  return (
    <Section title="Voigt constant Q">
      <p className="text-note text-muted">
        For exp(−iωt) and m = +z, into the film: ε_xy = +iQN². A magnetic layer needs it.
      </p>
      <KindField<VoigtForm>
        label="Q is given by"
        form={voigt}
        options={offered}
        make={(kind) => (kind === 'import' ? voigt : blankVoigt(kind, rangeOfForm(start)))}
        onChange={change}
      />
      <VoigtFields voigt={voigt} onChange={change} />
      <SectionIssues path="voigt" isField={(path) => isField(content, path)} />
      {fit}
      {voigt.kind === 'none' ? null : (
        <SourceFields
          of="Q"
          path="voigtSource"
          source={voigtSource}
          action={
            <Button className="py-1!" onClick={() => onChange({ voigtSource: indexSource })}>
              Same as n and k
            </Button>
          }
          onChange={(source) => onChange({ voigtSource: source })}
        />
      )}
    </Section>
  );
}

function VoigtFields({ voigt, onChange }: { voigt: VoigtForm; onChange: (voigt: VoigtForm) => void }) {
  switch (voigt.kind) {
    case 'none':
      return null;
    case 'mixture':
      return <p>Q follows from the Q of the two materials, by the model of the mixture.</p>;
    case 'import':
      return <ImportedNote form={voigt} />;
    case 'table':
      return (
        <TableGrid
          label="Table of Q"
          columns={['wavelength (nm)', 'Re Q', 'Im Q']}
          rows={voigt.rows}
          pathOf={voigtCellPath}
          onChange={(rows) => onChange({ ...voigt, rows })}
        />
      );
    case 'lines':
    case 'formula':
      return (
        <>
          {voigt.kind === 'lines' ? (
            <LinesFields form={voigt} onChange={onChange} />
          ) : (
            <VoigtFormulaFields form={voigt} onChange={onChange} />
          )}
          <RangeFields
            path="voigt.rangeNm"
            rangeNm={voigt.rangeNm}
            onChange={(rangeNm) => onChange({ ...voigt, rangeNm })}
          />
        </>
      );
  }
}

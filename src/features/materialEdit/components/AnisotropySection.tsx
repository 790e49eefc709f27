import { Button } from '../../../components/Button.tsx';
import type { EditContent } from '../hooks/useMaterialEditor.ts';
import { blankAnisotropy, blankPlainIndex, rangeOfForm } from '../model/blankForm.ts';
import type { AnisotropyForm, ContentForm, FormOf, PlainIndexForm } from '../model/form.ts';
import { isField } from '../model/isField.ts';
import { CubicFields } from './CubicFields.tsx';
import { plainIndexOptions } from './IndexSection.tsx';
import { KindField } from './KindField.tsx';
import { NumberField } from './NumberField.tsx';
import { PlainIndexFields } from './PlainIndexFields.tsx';
import { Section } from './Section.tsx';
import { SectionIssues } from './SectionIssues.tsx';
import { SourceFields } from './SourceFields.tsx';

const options = [
  { value: 'none' as const, label: 'none: N and Q say all' },
  { value: 'uniaxial' as const, label: 'uniaxial: a second index along an axis' },
  { value: 'cubic' as const, label: 'cubic, of second order in m' },
];

type Props = { content: ContentForm; onChange: EditContent };

/** What makes a crystal more than N and Q. */
export function AnisotropySection({ content, onChange }: Props) {
  const { anisotropy, anisotropySource, indexSource } = content;
  const change = (next: AnisotropyForm) => onChange({ anisotropy: next });
  return (
    <Section title="Anisotropy">
      <KindField label="Kind" form={anisotropy} options={options} make={blankAnisotropy} onChange={change} />
      {anisotropy.kind === 'uniaxial' ? <UniaxialFields form={anisotropy} onChange={change} /> : null}
      {anisotropy.kind === 'cubic' ? <CubicFields form={anisotropy} onChange={change} /> : null}
      <SectionIssues path="anisotropy" isField={(path) => isField(content, path)} />
      {anisotropy.kind === 'none' ? null : (
        <SourceFields
          of="these constants"
          path="anisotropySource"
          source={anisotropySource}
          action={
            <Button className="py-1!" onClick={() => onChange({ anisotropySource: indexSource })}>
              Same as n and k
            </Button>
          }
          onChange={(source) => onChange({ anisotropySource: source })}
        />
      )}
    </Section>
  );
}

type Uniaxial = FormOf<AnisotropyForm, 'uniaxial'>;

function UniaxialFields({ form, onChange }: { form: Uniaxial; onChange: (form: Uniaxial) => void }) {
  const { extraordinary, axis } = form;
  const changeIndex = (next: PlainIndexForm) => onChange({ ...form, extraordinary: next });
  const changeAxis = (at: number, value: number) => {
    const part = (one: 0 | 1 | 2) => (one === at ? value : axis[one]);
    onChange({ ...form, axis: [part(0), part(1), part(2)] });
  };
  return (
    <>
      <p className="text-note text-muted">
        n and k above are the ordinary index, for fields across the axis; here is the extraordinary one, for
        fields along it.
      </p>
      <KindField
        label="The extraordinary index is given by"
        form={extraordinary}
        options={plainIndexOptions}
        make={(kind) => blankPlainIndex(kind, rangeOfForm(extraordinary))}
        onChange={changeIndex}
      />
      <PlainIndexFields
        form={extraordinary}
        path="anisotropy.extraordinary"
        name="the extraordinary index"
        onChange={changeIndex}
      />
      <div role="group" aria-label="Optic axis" className="flex flex-wrap gap-3">
        {(['x', 'y', 'z'] as const).map((name, at) => (
          <NumberField
            key={name}
            label={`Axis ${name}`}
            path={`anisotropy.axis[${at}]`}
            value={axis[at] ?? 0}
            step={0.1}
            className="w-24"
            onChange={(value) => changeAxis(at, value)}
          />
        ))}
        <p className="w-full text-note text-muted">
          A direction of any length; z points into the film, x lies in the plane of incidence.
        </p>
      </div>
    </>
  );
}

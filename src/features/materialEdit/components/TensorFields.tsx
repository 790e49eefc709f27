import { NumberInput } from '../../../components/NumberInput.tsx';
import type { Complex } from '../../../../shared/complex.ts';
import { useIssue } from '../hooks/issueContext.ts';
import { blankTensorEntry } from '../model/blankForm.ts';
import type { FormOf, IndexForm } from '../model/form.ts';
import { Definition } from './Definition.tsx';
import { NumberField } from './NumberField.tsx';
import { TermList } from './TermList.tsx';

type TensorForm = FormOf<IndexForm, 'tensor'>;
type Entry = TensorForm['entries'][number];
type Tensor = Entry['epsilon'];

/** Wavelengths that are typed by hand; more of them belong into an import of another kind. */
const MOST_ENTRIES = 50;

const axes = ['x', 'y', 'z'] as const;

/** A free permittivity tensor, at one wavelength or at several. */
export function TensorFields({ form, onChange }: { form: TensorForm; onChange: (form: TensorForm) => void }) {
  const last = form.entries.at(-1)?.wavelengthNm ?? 600;
  return (
    <>
      <Definition
        formula={
          <>
            <var>D</var> = ε <var>E</var>, rows and columns x, y, z
          </>
        }
      >
        Relative permittivity for exp(−iωt), z into the film, real and imaginary part. It carries its own
        magnetization: ε_xy = iQε for m = +z. With one entry the material is known at that wavelength only;
        with several it is joined between them.
      </Definition>
      <TermList
        noun="wavelength"
        most={MOST_ENTRIES}
        terms={form.entries}
        nameOf={(entry) => `${entry.wavelengthNm} nm`}
        onChange={(entries) => onChange({ ...form, entries })}
        additions={[
          {
            label: 'Add a wavelength',
            make: () => ({ ...(form.entries.at(-1) ?? blankTensorEntry(last)), wavelengthNm: last + 50 }),
          },
        ]}
      >
        {(entry, at, change) => <EntryFields entry={entry} at={at} onChange={change} />}
      </TermList>
    </>
  );
}

function EntryFields({
  entry,
  at,
  onChange,
}: {
  entry: Entry;
  at: number;
  onChange: (entry: Entry) => void;
}) {
  return (
    <div className="flex w-full flex-col gap-2">
      <NumberField
        label="Wavelength"
        unit="nm"
        path={`index.wavelengthsNm[${at}]`}
        value={entry.wavelengthNm}
        step={1}
        onChange={(wavelengthNm) => onChange({ ...entry, wavelengthNm })}
      />
      <div className="grid gap-2 sm:grid-cols-3">
        {entry.epsilon.flatMap((row, i) =>
          row.map((element, j) => (
            <Element
              key={`${i}${j}`}
              label={`ε ${axes[i]}${axes[j]}`}
              path={`index.epsilon[${at}][${i}][${j}]`}
              value={element}
              onChange={(value) => onChange({ ...entry, epsilon: withElement(entry.epsilon, i, j, value) })}
            />
          )),
        )}
      </div>
    </div>
  );
}

function withElement(tensor: Tensor, row: number, column: number, value: Complex): Tensor {
  const element = (i: number, j: number): Complex => (i === row && j === column ? value : tensor[i]![j]!);
  const rowOf = (i: number): Tensor[number] => [element(i, 0), element(i, 1), element(i, 2)];
  return [rowOf(0), rowOf(1), rowOf(2)];
}

type ElementProps = { label: string; path: string; value: Complex; onChange: (value: Complex) => void };

/** A complex number in two fields beside each other. */
function Element({ label, path, value: [re, im], onChange }: ElementProps) {
  return (
    <div role="group" aria-label={label} className="min-w-0">
      <span className="text-note text-muted">{label}</span>
      <div className="flex gap-1">
        <Part name="real" path={`${path}[0]`} value={re} onChange={(next) => onChange([next, im])} />
        <Part
          name="imaginary"
          path={`${path}[1]`}
          value={im}
          unit="i"
          onChange={(next) => onChange([re, next])}
        />
      </div>
    </div>
  );
}

type PartProps = {
  name: string;
  path: string;
  value: number;
  unit?: string;
  onChange: (value: number) => void;
};

function Part({ name, path, value, unit, onChange }: PartProps) {
  const problem = useIssue(path);
  return (
    <label className="min-w-0 flex-1">
      <span className="sr-only">{name} part</span>
      <NumberInput
        value={value}
        step={0.01}
        {...(unit ? { unit } : {})}
        aria-invalid={problem ? true : undefined}
        onChange={onChange}
      />
      {problem ? <span className="text-small text-danger">▲ {problem}</span> : null}
    </label>
  );
}

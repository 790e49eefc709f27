import { FORMULA_LENGTH, formulaQuantities } from '../../../../shared/dispersion.ts';
import type { FormOf, PlainIndexForm, VoigtForm } from '../model/form.ts';
import { Button } from '../../../components/Button.tsx';
import { ChoiceField } from './ChoiceField.tsx';
import { NumberField } from './NumberField.tsx';
import { TextField } from './TextField.tsx';

/** Most coefficients of a formula (shared/dispersion.ts refuses more). */
const MOST_COEFFICIENTS = 40;

type Fields = { expression: string; coefficients: number[] };

type Props<Form extends Fields> = {
  form: Form;
  path: string;
  /** Whether the value may be complex, so that i is allowed. */
  complex: boolean;
  onChange: (form: Form) => void;
};

/** A formula as text and the numbers it names, with what it may consist of. */
function ExpressionFields<Form extends Fields>({ form, path, complex, onChange }: Props<Form>) {
  return (
    <>
      <TextField
        label="Formula"
        plain
        lines={2}
        path={`${path}.expression`}
        value={form.expression}
        maxLength={FORMULA_LENGTH}
        onChange={(expression) => onChange({ ...form, expression })}
        hint={
          <>
            L is the vacuum wavelength in µm, E the photon energy in eV, c1, c2, … the coefficients below
            {complex ? ', i the imaginary unit' : ''}. Allowed are numbers, + − * / ^, parentheses and sqrt,
            exp, log, sin, cos, tan, atan, sinh, cosh, tanh, abs{complex ? ', re, im, conj' : ''} of one
            value; a product is written with *; nothing else.
          </>
        }
      />
      <Coefficients
        path={`${path}.coefficients`}
        values={form.coefficients}
        onChange={(coefficients) => onChange({ ...form, coefficients })}
      />
    </>
  );
}

type CoefficientsProps = { path: string; values: number[]; onChange: (values: number[]) => void };

/** The numbers c1, c2, ... Only the last can go: taking one from the middle would rename those after it. */
function Coefficients({ path, values, onChange }: CoefficientsProps) {
  return (
    <div role="group" aria-label="Coefficients" className="flex flex-col gap-2">
      <div className="flex flex-wrap gap-3">
        {values.map((value, position) => (
          <NumberField
            key={position}
            label={`c${position + 1}`}
            path={`${path}[${position}]`}
            value={value}
            onChange={(next) => onChange(values.map((one, at) => (at === position ? next : one)))}
          />
        ))}
      </div>
      <div className="flex flex-wrap gap-1.5">
        <Button
          className="py-1!"
          disabled={values.length >= MOST_COEFFICIENTS}
          onClick={() => onChange([...values, 0])}
        >
          Add c{values.length + 1}
        </Button>
        {values.length > 0 ? (
          <Button className="py-1!" tone="plain" onClick={() => onChange(values.slice(0, -1))}>
            Remove c{values.length}
          </Button>
        ) : null}
      </div>
    </div>
  );
}

const quantityTexts = {
  n: 'n, real; k = 0',
  N: 'N = n + ik',
  eps: 'ε = N²',
} satisfies Record<(typeof formulaQuantities)[number], string>;

const quantityOptions = formulaQuantities.map((value) => ({ value, label: quantityTexts[value] }));

type IndexForm = FormOf<PlainIndexForm, 'formula'>;

export function IndexFormulaFields(props: {
  form: IndexForm;
  path: string;
  onChange: (form: IndexForm) => void;
}) {
  const { form, path, onChange } = props;
  return (
    <>
      <ChoiceField
        label="The formula gives"
        path={`${path}.quantity`}
        value={form.quantity}
        options={quantityOptions}
        className="w-56"
        onChange={(quantity) => onChange({ ...form, quantity })}
      />
      <ExpressionFields form={form} path={path} complex={form.quantity !== 'n'} onChange={onChange} />
    </>
  );
}

type QForm = FormOf<VoigtForm, 'formula'>;

export function VoigtFormulaFields({ form, onChange }: { form: QForm; onChange: (form: QForm) => void }) {
  return <ExpressionFields form={form} path="voigt" complex onChange={onChange} />;
}

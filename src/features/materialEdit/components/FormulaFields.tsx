import { FORMULA_LENGTH, formulaQuantities } from '../../../../shared/dispersion.ts';
import type { FormOf, PlainIndexForm, VoigtForm } from '../model/form.ts';
import { ChoiceField } from './ChoiceField.tsx';
import { NumberField } from './NumberField.tsx';
import { TermList } from './TermList.tsx';
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
      <TermList
        noun="coefficient"
        most={MOST_COEFFICIENTS}
        least={0}
        terms={form.coefficients}
        onChange={(coefficients) => onChange({ ...form, coefficients })}
        additions={[{ label: 'Add a coefficient', make: () => 0 }]}
      >
        {(value, at, change) => (
          <NumberField
            label={`c${at + 1}`}
            path={`${path}.coefficients[${at}]`}
            value={value}
            className="w-44"
            onChange={change}
          />
        )}
      </TermList>
    </>
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

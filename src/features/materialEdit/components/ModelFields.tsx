import type { FormOf, PlainIndexForm } from '../model/form.ts';
import { Check } from './Check.tsx';
import { Definition } from './Definition.tsx';
import { NumberField } from './NumberField.tsx';
import { TermList } from './TermList.tsx';

/** Most terms of a sum (shared/dispersion.ts refuses more). */
export const MOST_TERMS = 12;

type Props<Kind extends PlainIndexForm['kind']> = {
  form: FormOf<PlainIndexForm, Kind>;
  path: string;
  onChange: (form: FormOf<PlainIndexForm, Kind>) => void;
};

export function SellmeierFields({ form, path, onChange }: Props<'sellmeier'>) {
  return (
    <>
      <Definition
        formula={
          <>
            <var>n</var>² = A + Σ <var>B</var> <var>L</var>² / (<var>L</var>² − <var>C</var>), <var>k</var> =
            0
          </>
        }
      >
        L is the vacuum wavelength in µm; A and B have no unit, C is in µm² (the square of a resonance
        wavelength). Where a source squares its C, square it here.
      </Definition>
      <NumberField
        label="A"
        path={`${path}.constant`}
        value={form.constant}
        onChange={(constant) => onChange({ ...form, constant })}
      />
      <TermList
        noun="term"
        most={MOST_TERMS}
        terms={form.terms}
        onChange={(terms) => onChange({ ...form, terms })}
        additions={[{ label: 'Add a term', make: () => ({ b: 0.1, cUm2: 0.01 }) }]}
      >
        {(term, at, change) => (
          <>
            <NumberField
              label="B"
              path={`${path}.terms[${at}].b`}
              value={term.b}
              className="w-44"
              onChange={(b) => change({ ...term, b })}
            />
            <NumberField
              label="C"
              unit="µm²"
              path={`${path}.terms[${at}].cUm2`}
              value={term.cUm2}
              step={0.001}
              className="w-44"
              onChange={(cUm2) => change({ ...term, cUm2 })}
            />
          </>
        )}
      </TermList>
    </>
  );
}

export function CauchyFields({ form, path, onChange }: Props<'cauchy'>) {
  const { tail } = form;
  return (
    <>
      <Definition
        formula={
          <>
            <var>n</var> = A + B / <var>L</var>² + C / <var>L</var>⁴
            {tail ? (
              <>
                , <var>k</var> = <var>k</var>₀ exp(<var>s</var> (<var>E</var> − <var>E</var>₀))
              </>
            ) : (
              <>
                , <var>k</var> = 0
              </>
            )}
          </>
        }
      >
        L is the vacuum wavelength in µm, so B is in µm² and C in µm⁴
        {tail ? '; E is the photon energy in eV, k₀ the value of k at E₀, s in 1/eV' : ''}.
      </Definition>
      <div className="flex flex-wrap gap-3">
        <NumberField label="A" path={`${path}.a`} value={form.a} onChange={(a) => onChange({ ...form, a })} />
        <NumberField
          label="B"
          unit="µm²"
          path={`${path}.bUm2`}
          value={form.bUm2}
          step={0.001}
          onChange={(bUm2) => onChange({ ...form, bUm2 })}
        />
        <NumberField
          label="C"
          unit="µm⁴"
          path={`${path}.cUm4`}
          value={form.cUm4}
          step={0.0001}
          onChange={(cUm4) => onChange({ ...form, cUm4 })}
        />
      </div>
      <Check
        label="It absorbs toward short wavelengths (exponential tail)"
        checked={tail !== null}
        onChange={(checked) => onChange({ ...form, tail: checked ? { k: 0.01, perEv: 2, atEv: 3.5 } : null })}
      />
      {tail ? (
        <div className="flex flex-wrap gap-3">
          <NumberField
            label="k₀"
            path={`${path}.tail.k`}
            value={tail.k}
            onChange={(k) => onChange({ ...form, tail: { ...tail, k } })}
          />
          <NumberField
            label="s"
            unit="1/eV"
            path={`${path}.tail.perEv`}
            value={tail.perEv}
            step={0.1}
            onChange={(perEv) => onChange({ ...form, tail: { ...tail, perEv } })}
          />
          <NumberField
            label="E₀"
            unit="eV"
            path={`${path}.tail.atEv`}
            value={tail.atEv}
            step={0.1}
            onChange={(atEv) => onChange({ ...form, tail: { ...tail, atEv } })}
          />
        </div>
      ) : null}
    </>
  );
}

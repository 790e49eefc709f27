import { blankOscillator } from '../model/blankForm.ts';
import type { FormOf, OscillatorForm, PlainIndexForm } from '../model/form.ts';
import { Definition } from './Definition.tsx';
import { MOST_TERMS } from './ModelFields.tsx';
import { NumberField } from './NumberField.tsx';
import { TermList } from './TermList.tsx';

type Props = {
  form: FormOf<PlainIndexForm, 'oscillators'>;
  path: string;
  onChange: (form: FormOf<PlainIndexForm, 'oscillators'>) => void;
};

const kindNames: Record<OscillatorForm['kind'], string> = {
  drude: 'Drude (free electrons)',
  lorentz: 'Lorentz',
  'tauc-lorentz': 'Tauc-Lorentz (above a gap)',
};

const additions = (['lorentz', 'drude', 'tauc-lorentz'] as const).map((kind) => ({
  label: { drude: 'Add Drude', lorentz: 'Add Lorentz', 'tauc-lorentz': 'Add Tauc-Lorentz' }[kind],
  make: () => blankOscillator(kind),
}));

/** A permittivity as a constant and a sum of oscillators, each with its formula beside it. */
export function OscillatorFields({ form, path, onChange }: Props) {
  return (
    <>
      <Definition
        formula={
          <>
            ε(<var>E</var>) = ε∞ + Σ terms, <var>N</var> = √ε
          </>
        }
      >
        E is the photon energy in eV, and so is every energy below. ε∞ stands for everything far above the
        range.
      </Definition>
      <NumberField
        label="ε∞"
        path={`${path}.epsInfinity`}
        value={form.epsInfinity}
        step={0.1}
        onChange={(epsInfinity) => onChange({ ...form, epsInfinity })}
      />
      <TermList
        noun="term"
        most={MOST_TERMS}
        terms={form.terms}
        nameOf={(term) => kindNames[term.kind]}
        onChange={(terms) => onChange({ ...form, terms })}
        additions={additions}
      >
        {(term, at, change) => (
          <>
            <p className="w-full text-note">{formulaOf[term.kind]}</p>
            <OscillatorNumbers term={term} path={`${path}.terms[${at}]`} onChange={change} />
          </>
        )}
      </TermList>
    </>
  );
}

const formulaOf = {
  drude: '− Ep² / (E² + iΓE)',
  lorentz: 'f E₀² / (E₀² − E² − iΓE)',
  'tauc-lorentz':
    'Im: A E₀ Γ (E − Eg)² / {E [(E² − E₀²)² + Γ²E²]} for E > Eg, else 0; Re by Kramers-Kronig (Jellison and Modine 1996)',
} satisfies Record<OscillatorForm['kind'], string>;

type NumbersProps = {
  term: OscillatorForm;
  path: string;
  onChange: (term: OscillatorForm) => void;
};

function OscillatorNumbers({ term, path, onChange }: NumbersProps) {
  const energy = (label: string, field: string, value: number, change: (value: number) => OscillatorForm) => (
    <NumberField
      key={field}
      label={label}
      unit="eV"
      path={`${path}.${field}`}
      value={value}
      step={0.1}
      onChange={(next) => onChange(change(next))}
    />
  );
  const damping = energy('Γ, width', 'dampingEv', term.dampingEv, (dampingEv) => ({ ...term, dampingEv }));
  switch (term.kind) {
    case 'drude':
      return (
        <>
          {energy('Ep, plasma', 'plasmaEv', term.plasmaEv, (plasmaEv) => ({ ...term, plasmaEv }))}
          {damping}
        </>
      );
    case 'lorentz':
      return (
        <>
          <NumberField
            label="f, strength"
            path={`${path}.strength`}
            value={term.strength}
            step={0.1}
            onChange={(strength) => onChange({ ...term, strength })}
          />
          {energy('E₀, centre', 'centreEv', term.centreEv, (centreEv) => ({ ...term, centreEv }))}
          {damping}
        </>
      );
    case 'tauc-lorentz':
      return (
        <>
          {energy('A, amplitude', 'amplitudeEv', term.amplitudeEv, (amplitudeEv) => ({
            ...term,
            amplitudeEv,
          }))}
          {energy('Eg, gap', 'gapEv', term.gapEv, (gapEv) => ({ ...term, gapEv }))}
          {energy('E₀, centre', 'centreEv', term.centreEv, (centreEv) => ({ ...term, centreEv }))}
          {damping}
        </>
      );
  }
}

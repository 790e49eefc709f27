import { blankLine } from '../model/blankForm.ts';
import type { FormOf, VoigtForm } from '../model/form.ts';
import { ChoiceField } from './ChoiceField.tsx';
import { Definition } from './Definition.tsx';
import { MOST_TERMS } from './ModelFields.tsx';
import { NumberField } from './NumberField.tsx';
import { TermList } from './TermList.tsx';

type LinesForm = FormOf<VoigtForm, 'lines'>;

const sumOptions = [
  { value: 'gyration' as const, label: 'g = Q N², divided by N² to give Q' },
  { value: 'voigt' as const, label: 'Q itself' },
];

const shapeOptions = [
  { value: 'paramagnetic' as const, label: 'paramagnetic' },
  { value: 'diamagnetic' as const, label: 'diamagnetic' },
];

const shapeFormulas = {
  paramagnetic: 'A E₀ F / (E₀² − F²)',
  diamagnetic: 'A E₀³ F / (E₀² − F²)²',
};

/** Q as a sum of lines against photon energy. */
export function LinesFields({ form, onChange }: { form: LinesForm; onChange: (form: LinesForm) => void }) {
  return (
    <>
      <ChoiceField
        label="The lines add up to"
        path="voigt.of"
        value={form.of}
        options={sumOptions}
        className="max-w-md"
        onChange={(of) => onChange({ ...form, of })}
      />
      <Definition
        formula={
          <>
            <var>F</var> = <var>E</var> + iΓ; paramagnetic {shapeFormulas.paramagnetic}, diamagnetic{' '}
            {shapeFormulas.diamagnetic}
          </>
        }
      >
        E is the photon energy, E₀ the centre and Γ the width, all in eV; A has no unit and may be negative.
        Paramagnetic: the two circular transitions differ in strength. Diamagnetic: they differ in energy.
      </Definition>
      <TermList
        noun="line"
        most={MOST_TERMS}
        terms={form.lines}
        onChange={(lines) => onChange({ ...form, lines })}
        additions={[{ label: 'Add a line', make: blankLine }]}
      >
        {(line, at, change) => (
          <>
            <ChoiceField
              label="Shape"
              path={`voigt.lines[${at}].shape`}
              value={line.shape}
              options={shapeOptions}
              onChange={(shape) => change({ ...line, shape })}
            />
            <NumberField
              label="A, amplitude"
              path={`voigt.lines[${at}].amplitude`}
              value={line.amplitude}
              onChange={(amplitude) => change({ ...line, amplitude })}
            />
            <NumberField
              label="E₀, centre"
              unit="eV"
              path={`voigt.lines[${at}].centreEv`}
              value={line.centreEv}
              step={0.1}
              onChange={(centreEv) => change({ ...line, centreEv })}
            />
            <NumberField
              label="Γ, width"
              unit="eV"
              path={`voigt.lines[${at}].dampingEv`}
              value={line.dampingEv}
              step={0.1}
              onChange={(dampingEv) => change({ ...line, dampingEv })}
            />
          </>
        )}
      </TermList>
    </>
  );
}

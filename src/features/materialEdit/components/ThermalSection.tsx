import { LIMITS } from '../../../../shared/limits.ts';
import type { ThermalForm } from '../model/form.ts';
import { Check } from './Check.tsx';
import { Definition } from './Definition.tsx';
import { NumberField } from './NumberField.tsx';
import { Section } from './Section.tsx';
import { TextField } from './TextField.tsx';

type Props = { thermal: ThermalForm; onChange: (thermal: ThermalForm) => void };

/** The exponents of a mean field near the Curie point and of spin waves far below are both near these. */
const usual = { curieK: 1000, a: 1.5, b: 0.36, citation: '' };

/** How the magnetization falls with temperature: an optional help for layers of this material. */
export function ThermalSection({ thermal, onChange }: Props) {
  return (
    <Section title="Temperature">
      <Check
        label="The magnetization follows a law of temperature"
        checked={thermal !== null}
        onChange={(checked) => onChange(checked ? usual : null)}
      />
      {thermal ? (
        <>
          <Definition
            formula={
              <>
                <var>m</var>(<var>T</var>) = (1 − (<var>T</var>/<var>T</var>c)ᵃ)ᵇ
              </>
            }
          >
            A fraction of the saturation at 0 K; 0 from the Curie temperature Tc on. A layer may use it to
            scale Q from the temperature at which Q is known.
          </Definition>
          <div className="flex flex-wrap gap-3">
            <NumberField
              label="Tc"
              unit="K"
              path="thermal.curieK"
              value={thermal.curieK}
              step={10}
              onChange={(curieK) => onChange({ ...thermal, curieK })}
            />
            <NumberField
              label="a"
              path="thermal.a"
              value={thermal.a}
              step={0.1}
              className="w-24"
              onChange={(a) => onChange({ ...thermal, a })}
            />
            <NumberField
              label="b"
              path="thermal.b"
              value={thermal.b}
              className="w-24"
              onChange={(b) => onChange({ ...thermal, b })}
            />
          </div>
          <TextField
            label="Where Tc and the exponents come from (required)"
            path="thermal.citation"
            value={thermal.citation}
            maxLength={LIMITS.noteLength}
            placeholder="a citation, or whose choice they are"
            onChange={(citation) => onChange({ ...thermal, citation })}
          />
        </>
      ) : null}
    </Section>
  );
}

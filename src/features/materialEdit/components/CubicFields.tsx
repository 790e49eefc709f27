import type { Complex } from '../../../../shared/complex.ts';
import type { AnisotropyForm, FormOf } from '../model/form.ts';
import { Definition } from './Definition.tsx';
import { NumberField } from './NumberField.tsx';

type Cubic = FormOf<AnisotropyForm, 'cubic'>;

type Props = { form: Cubic; onChange: (form: Cubic) => void };

/** The constants of second order in m of a cubic crystal, known at one wavelength. */
export function CubicFields({ form, onChange }: Props) {
  return (
    <>
      <Definition formula="δε₁₁ = G₁₁m₁² + G₁₂(m₂² + m₃²) and cyclic; δε₁₂ = δε₂₁ = 2G₄₄m₁m₂ and cyclic">
        In the axes of the crystal: [001] is z, [100] is turned by the azimuth from x toward y. G are parts of
        the relative permittivity, for exp(−iωt).
      </Definition>
      <div className="flex flex-wrap gap-3">
        <NumberField
          label="Known at"
          unit="nm"
          path="anisotropy.wavelengthNm"
          value={form.wavelengthNm}
          step={1}
          onChange={(wavelengthNm) => onChange({ ...form, wavelengthNm })}
        />
        <NumberField
          label="Azimuth of [100]"
          unit="°"
          path="anisotropy.azimuthDeg"
          value={form.azimuthDeg}
          step={5}
          onChange={(azimuthDeg) => onChange({ ...form, azimuthDeg })}
        />
      </div>
      <ComplexFields
        name="G₁₁"
        path="anisotropy.g11"
        value={form.g11}
        onChange={(g11) => onChange({ ...form, g11 })}
      />
      <ComplexFields
        name="G₁₂"
        path="anisotropy.g12"
        value={form.g12}
        onChange={(g12) => onChange({ ...form, g12 })}
      />
      <ComplexFields
        name="G₄₄"
        path="anisotropy.g44"
        value={form.g44}
        onChange={(g44) => onChange({ ...form, g44 })}
      />
    </>
  );
}

type ComplexProps = { name: string; path: string; value: Complex; onChange: (value: Complex) => void };

function ComplexFields({ name, path, value: [re, im], onChange }: ComplexProps) {
  return (
    <div className="flex gap-3">
      <NumberField
        label={`Re ${name}`}
        path={`${path}[0]`}
        value={re}
        step={0.001}
        onChange={(next) => onChange([next, im])}
      />
      <NumberField
        label={`Im ${name}`}
        path={`${path}[1]`}
        value={im}
        step={0.001}
        onChange={(next) => onChange([re, next])}
      />
    </div>
  );
}

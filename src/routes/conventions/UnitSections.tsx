import { EV_NM } from '../../../shared/units.ts';
import { ConventionSection } from './ConventionSection.tsx';

export function UnitSections() {
  return (
    <ConventionSection id="units" title="Units">
      <dl className="grid grid-cols-[auto_1fr] gap-x-6 gap-y-1.5">
        <dt className="text-muted">lengths</dt>
        <dd>nm, wavelengths too; a wavelength is always that in vacuum</dd>
        <dt className="text-muted">photon energy</dt>
        <dd>eV = {EV_NM} / wavelength in nm</dd>
        <dt className="text-muted">angles of setting</dt>
        <dd>degrees</dd>
        <dt className="text-muted">Kerr angles</dt>
        <dd>mdeg on screen, degrees in files and in the API; 1 mdeg = 0.001° = 0.01745 mrad</dd>
        <dt className="text-muted">magnetization</dt>
        <dd>fraction of saturation, 0 to 1</dd>
        <dt className="text-muted">
          <var>R</var>, <var>T</var>, <var>A</var>, amplitudes, <var>Q</var>
        </dt>
        <dd>without unit, as a fraction of 1</dd>
      </dl>
      <p>
        Field names in files and in the API carry their unit: <code>thicknessNm</code>, <code>angleDeg</code>.
      </p>
    </ConventionSection>
  );
}

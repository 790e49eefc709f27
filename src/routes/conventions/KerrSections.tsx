import { ConventionSection, Formula } from './ConventionSection.tsx';
import { EllipseDrawing } from './EllipseDrawing.tsx';

/** Polarization of a beam, and what magnetization changes in it. */
export function KerrSections() {
  return (
    <>
      <ConventionSection id="ellipse" title="Azimuth and ellipticity of a beam">
        <div className="flex flex-wrap items-center gap-6">
          <div className="card p-3">
            <EllipseDrawing />
          </div>
          <p className="min-w-56 flex-1">
            Both angles are positive counter-clockwise for an observer who looks into the arriving beam. The
            azimuth is counted from <var>p</var> (0°) toward <var>s</var> (90°).
          </p>
        </div>
        <p>From the field of the reflected beam, the Stokes parameters</p>
        <Formula>
          <var>S</var>
          <sub>0</sub> = |<var>E</var>
          <sub>p</sub>|<sup>2</sup> + |<var>E</var>
          <sub>s</sub>|<sup>2</sup>, <var>S</var>
          <sub>1</sub> = |<var>E</var>
          <sub>p</sub>|<sup>2</sup> − |<var>E</var>
          <sub>s</sub>|<sup>2</sup>
        </Formula>
        <Formula>
          <var>S</var>
          <sub>2</sub> = 2 Re(<var>E</var>
          <sub>p</sub> <var>E</var>
          <sub>s</sub>*), <var>S</var>
          <sub>3</sub> = 2 Im(<var>E</var>
          <sub>p</sub>* <var>E</var>
          <sub>s</sub>)
        </Formula>
        <p>and from them azimuth and ellipticity, for a fully polarized beam</p>
        <Formula>
          <var>φ</var> = ½ atan2(<var>S</var>
          <sub>2</sub>, <var>S</var>
          <sub>1</sub>), <var>χ</var> = ½ atan2(<var>S</var>
          <sub>3</sub>, √(<var>S</var>
          <sub>1</sub>
          <sup>2</sup> + <var>S</var>
          <sub>2</sub>
          <sup>2</sup>))
        </Formula>
        <p>
          For a beam that is fully polarized 2<var>χ</var> is also the arc sine of <var>S</var>
          <sub>3</sub>/<var>S</var>
          <sub>0</sub>. Where a beam is partly polarized (a back face, a spread) the two differ, and the
          ellipticity given is half the arc sine of <var>S</var>
          <sub>3</sub>/<var>S</var>
          <sub>0</sub>: what a modulated detector reads against all of the light.
        </p>
        <p>
          An ellipse turned by 180° is the same ellipse, so differences of azimuths are folded into (−90°,
          90°]. Where <var>S</var>
          <sub>0</sub> &lt; 10<sup>−28</sup> there is no beam to speak of, and both angles are left empty.
        </p>
      </ConventionSection>

      <ConventionSection id="kerr-rotation" title="Kerr rotation">
        <p>
          The change that magnetization makes in the azimuth: the stack as it is, against the same stack with{' '}
          <var>m</var> = 0 in every layer.
        </p>
        <Formula>
          <var>φ</var>
          <sub>K</sub> = fold(<var>φ</var>
          <sub>m</sub> − <var>φ</var>
          <sub>0</sub>)
        </Formula>
        <p>
          It is given for <var>p</var> light and for <var>s</var> light, and always exact. Where it is small,
        </p>
        <Formula>
          for <var>p</var> light <var>φ</var>
          <sub>K</sub> ≈ Re(<var>r</var>
          <sub>sp</sub>/<var>r</var>
          <sub>pp</sub>), for <var>s</var> light <var>φ</var>
          <sub>K</sub> ≈ −Re(<var>r</var>
          <sub>ps</sub>/<var>r</var>
          <sub>ss</sub>)
        </Formula>
        <p>
          Near the angle at which <var>r</var>
          <sub>pp</sub> almost vanishes the angles become large. They are shown as they are and not cut off;
          little light is left to measure them with, as the reflectance beside them says.
        </p>
        <p>
          In files and in the answers of the API, <code>kerr.p.rotationDeg</code> is the plain azimuth of the
          reflected beam less that of the incident one. With isotropic media and <var>p</var> or <var>s</var>{' '}
          light it is the same number, since <var>φ</var>
          <sub>0</sub> is then that of the incident light.
        </p>
      </ConventionSection>

      <ConventionSection id="kerr-ellipticity" title="Kerr ellipticity">
        <p>
          The change that magnetization makes in the ellipticity angle, against the same stack with m = 0:
        </p>
        <Formula>
          <var>χ</var>
          <sub>K</sub> = <var>χ</var>
          <sub>m</sub> − <var>χ</var>
          <sub>0</sub>
        </Formula>
        <p>
          tan <var>χ</var> is the short axis of the ellipse over the long one, positive where the field runs
          counter-clockwise for an observer who looks into the beam. Where it is small,
        </p>
        <Formula>
          for <var>p</var> light <var>χ</var>
          <sub>K</sub> ≈ Im(<var>r</var>
          <sub>sp</sub>/<var>r</var>
          <sub>pp</sub>), for <var>s</var> light <var>χ</var>
          <sub>K</sub> ≈ −Im(<var>r</var>
          <sub>ps</sub>/<var>r</var>
          <sub>ss</sub>)
        </Formula>
      </ConventionSection>
    </>
  );
}

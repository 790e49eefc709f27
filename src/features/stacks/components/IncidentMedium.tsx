import { memo } from 'react';
import type { Polarization, StackMedium } from '../../../../shared/stack.ts';
import { mediumName } from '../model/media.ts';
import { withNewest } from '../model/versions.ts';
import { useFilm } from './film.ts';
import { MediumNotes } from './MediumNotes.tsx';
import { MediumPicker } from './MediumPicker.tsx';
import { VersionNote } from './VersionNote.tsx';

type Props = { incident: StackMedium; wavelengthNm: number; input: Polarization };

/** What the light comes through, at the top of the drawing. */
export const IncidentMedium = memo(function IncidentMedium({ incident, wavelengthNm, input }: Props) {
  const { materials, edit, issues } = useFilm();
  const name = mediumName(incident, materials);
  const change = (medium: StackMedium, editName: string | null) =>
    edit?.((now) => ({ ...now, incident: medium }), editName);
  return (
    <div className="relative z-10 max-w-52">
      {edit ? (
        <MediumPicker
          medium={incident}
          label="the incident medium"
          lossless
          onChange={change}
          className="-ml-2 text-note text-muted"
        >
          {name}
        </MediumPicker>
      ) : (
        <span className="text-note text-muted">{name}</span>
      )}
      <p className="text-[11.5px] text-muted">
        {String(Number(wavelengthNm.toPrecision(7)))} nm
        {/* Two lines: the beam comes in close by. */}
        <br />
        {input} light
      </p>
      <VersionNote
        media={[incident]}
        onTake={edit ? () => change(withNewest(incident, materials), null) : undefined}
      />
      <MediumNotes
        medium={incident}
        magnetized={false}
        issues={issues.get('incident') ?? []}
        onChange={edit ? (medium) => change(medium, null) : undefined}
      />
    </div>
  );
});

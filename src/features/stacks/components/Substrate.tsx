import { memo } from 'react';
import type { StackDocument, StackMedium } from '../../../../shared/stack.ts';
import { isMagnetic, mediumClass, mediumName } from '../model/media.ts';
import { withNewest } from '../model/versions.ts';
import { classFill, magnetHatch } from './classColours.ts';
import { useFilm } from './film.ts';
import { MagnetizationChip } from './MagnetizationChip.tsx';
import { MediumNotes } from './MediumNotes.tsx';
import { MediumPicker } from './MediumPicker.tsx';
import { GradedBand, SlabBreak } from './SampleMarks.tsx';
import { VersionNote } from './VersionNote.tsx';

type Props = Pick<StackDocument, 'substrate' | 'substrateM' | 'backside'> & {
  /** Whether what lies above runs out into it. */
  graded: boolean;
  fillAbove: string;
};

/** What the film stands on, fading out downwards; what lies behind it where it is a slab. */
export const Substrate = memo(function Substrate(props: Props) {
  const { substrate, substrateM, backside, graded, fillAbove } = props;
  const { materials, edit, issues } = useFilm();
  const name = mediumName(substrate, materials);
  const change = (medium: StackMedium, editName: string | null) =>
    edit?.(({ substrateM: m, ...now }) => {
      const magnetic = isMagnetic(medium, materials);
      return { ...now, substrate: medium, ...(magnetic ? { substrateM: m ?? [0, 0, 1] } : {}) };
    }, editName);
  const takeNewest = () =>
    edit?.((now) => {
      return {
        ...now,
        substrate: withNewest(now.substrate, materials),
        ...(now.backside
          ? { backside: { ...now.backside, exit: withNewest(now.backside.exit, materials) } }
          : {}),
      };
    }, null);
  return (
    <div
      className="relative flex min-h-[104px] flex-col pt-3"
      style={{
        background: `linear-gradient(${classFill[mediumClass(substrate, materials)]}, transparent)`,
        ...(substrateM ? { backgroundImage: `${magnetHatch}` } : {}),
      }}
    >
      {graded && <GradedBand fillAbove={fillAbove} />}
      <div className="flex items-center gap-1.5 px-3">
        {edit ? (
          <MediumPicker
            medium={substrate}
            label="the substrate"
            onChange={change}
            className="text-lead font-semibold"
          >
            {name}
          </MediumPicker>
        ) : (
          <span className="px-2 text-lead font-semibold">{name}</span>
        )}
        <span className="text-note text-ink/80">substrate</span>
        {substrateM && (
          <span className="ml-auto">
            <MagnetizationChip
              m={substrateM}
              label="the substrate"
              fixed={false}
              onChange={
                edit ? (m) => edit((now) => ({ ...now, substrateM: m }), 'm of the substrate') : undefined
              }
            />
          </span>
        )}
      </div>
      <div className="px-1 pt-1">
        <VersionNote media={[substrate, backside?.exit]} onTake={edit ? takeNewest : undefined} />
        <MediumNotes
          medium={substrate}
          magnetized={substrateM !== undefined && substrateM.some((part) => part !== 0)}
          issues={issues.get('substrate') ?? []}
          onChange={edit ? (medium) => change(medium, null) : undefined}
        />
      </div>
      {backside && <SlabBreak backside={backside} />}
    </div>
  );
});

import { Ellipsis } from 'lucide-react';
import { memo } from 'react';
import type { PointerEvent } from 'react';
import type { StackLayer, StackMedium } from '../../../../shared/stack.ts';
import { IconButton } from '../../../components/Button.tsx';
import { Menu } from '../../../components/Menu.tsx';
import { Quantity } from '../../../components/Quantity.tsx';
import { withLayer } from '../model/items.ts';
import type { LayerPatch } from '../model/items.ts';
import { isMagnetic, mediumName } from '../model/media.ts';
import { lengthOf } from '../model/magnetization.ts';
import { withNewest } from '../model/versions.ts';
import { useFilm } from './film.ts';
import { Handle } from './Handle.tsx';
import { itemMenu } from './itemActions.ts';
import { LayerFacts } from './LayerFacts.tsx';
import { LayerNote } from './LayerNote.tsx';
import { MagnetizationChip } from './MagnetizationChip.tsx';
import { MediumNotes } from './MediumNotes.tsx';
import { MediumPicker } from './MediumPicker.tsx';
import { ThermalSection } from './ThermalSection.tsx';
import { VersionNote } from './VersionNote.tsx';

type Props = {
  layer: StackLayer;
  /** Position as people count, such as "2" or "3.1" inside a block. */
  position: string;
  onGrab?: ((id: string) => (event: PointerEvent) => void) | undefined;
};

/**
 * Everything that can be said of a layer, edited where it stands. Apart from its row, whose depth changes with every
 * layer above: a long film would otherwise be drawn whole at each keystroke.
 */
export const LayerControls = memo(function LayerControls({ layer, position, onGrab }: Props) {
  const { materials, edit, issues, announce } = useFilm();
  const name = mediumName(layer.medium, materials);
  const label = `${name}, layer ${position}`;
  const magnetic = layer.m !== undefined;
  const ownIssues = issues.get(layer.id) ?? [];
  const change = (patch: LayerPatch, what: string | null) =>
    edit?.((document) => withLayer(document, layer.id, patch), what && `${what} of ${layer.id}`);
  const changeMedium = (medium: StackMedium, what: string | null) => {
    const willBe = isMagnetic(medium, materials);
    // A material that can be magnetic arrives magnetized, or nothing would show what it does.
    const m = willBe ? (layer.m ?? [0, 0, 1]) : undefined;
    // A law of the temperature belongs to the material that it was given for.
    const thermal = medium.material === layer.medium.material ? layer.thermal : undefined;
    change({ medium, m, thermal }, what && 'constants');
  };
  const takeNewest = () => {
    const { medium, oxide } = layer;
    const newer = oxide && { ...oxide, medium: withNewest(oxide.medium, materials) };
    change({ medium: withNewest(medium, materials), oxide: newer }, null);
  };

  return (
    <>
      <div className="flex items-center gap-1.5 px-1">
        {edit && onGrab && <Handle id={layer.id} label={label} onGrab={onGrab} />}
        {edit ? (
          <MediumPicker
            medium={layer.medium}
            label={`layer ${position}`}
            onChange={changeMedium}
            className={`shrink-0 text-left text-lead font-semibold wrap-anywhere ${magnetic ? 'max-w-[30%] bg-paper/85' : 'max-w-[55%]'}`}
          >
            {name}
          </MediumPicker>
        ) : (
          <span
            className={`shrink-0 rounded-box px-2 py-[2px] text-lead font-semibold wrap-anywhere ${magnetic ? 'max-w-[30%] bg-paper/85' : 'ml-1 max-w-[55%]'}`}
          >
            {name}
          </span>
        )}
        <LayerNote
          note={layer.note ?? ''}
          label={label}
          onChange={edit && ((note) => change({ note }, 'note'))}
          crowded={magnetic}
        />
        <span className="ml-auto flex shrink-0 items-center gap-1.5">
          {layer.m && (
            <MagnetizationChip
              m={layer.m}
              label={label}
              fixed={layer.fixed === true}
              onChange={edit ? (m) => change({ m }, 'm') : undefined}
            >
              <ThermalSection layer={layer} onChange={(thermal) => change({ thermal }, 'temperature')} />
            </MagnetizationChip>
          )}
          <Quantity
            label={`thickness of ${label}`}
            unit="nm"
            value={layer.thicknessNm}
            min={0}
            step={layer.thicknessNm < 2 ? 0.1 : layer.thicknessNm < 100 ? 1 : 10}
            readOnly={edit === null}
            error={ownIssues.find(({ path }) => path === 'thicknessNm')?.message}
            onChange={(thicknessNm) => change({ thicknessNm }, 'thickness')}
          />
          {edit && (
            <Menu
              trigger={
                <IconButton label={`Actions for ${label}`} className="-mr-0.5 size-6!">
                  <Ellipsis size={15} aria-hidden />
                </IconButton>
              }
              items={itemMenu(layer, edit, announce)}
            />
          )}
        </span>
      </div>
      <LayerFacts layer={layer} />
      <VersionNote media={[layer.medium, layer.oxide?.medium]} onTake={edit ? takeNewest : undefined} />
      <MediumNotes
        medium={layer.medium}
        magnetized={layer.m !== undefined && lengthOf(layer.m) > 0}
        issues={ownIssues.filter(({ path }) => path !== 'thicknessNm')}
        onChange={edit ? (medium) => change({ medium }, null) : undefined}
      />
    </>
  );
});

import type { StackDocument, StackMedium } from '../../../../shared/stack.ts';
import type { EditFilm } from '../model/sampleParts.ts';
import type { PickMedium } from './pickMedium.ts';
import { Check, Row, SampleQuantity } from './SampleQuantity.tsx';

type Props = {
  document: StackDocument;
  edit: EditFilm;
  nameOf: (medium: StackMedium) => string;
  pickMedium: PickMedium;
};

/** A common wafer. */
const FIRST_SLAB_NM = 500_000;

/** The substrate as a thick slab, whose back face sends light back in intensity. */
export function BacksideForm({ document, edit, nameOf, pickMedium }: Props) {
  const { backside } = document;
  const change = (next: StackDocument['backside'], name: string | null) =>
    edit(({ backside: _before, ...now }) => (next ? { ...now, backside: next } : now), name);
  return (
    <div className="flex flex-col gap-1 border-t border-line pt-2">
      <Check
        label={`Light comes back from the back face of ${nameOf(document.substrate)}`}
        checked={backside !== undefined}
        onChange={(on) =>
          change(on ? { thicknessNm: FIRST_SLAB_NM, exit: document.incident } : undefined, null)
        }
      />
      {backside && (
        <div className="ml-5 flex flex-col gap-1">
          <Row label="Slab thickness">
            <SampleQuantity
              label="thickness of the slab"
              unit="mm"
              step={0.1}
              value={backside.thicknessNm / 1e6}
              onChange={(mm) => change({ ...backside, thicknessNm: mm * 1e6 }, 'slab')}
            />
          </Row>
          <Row label="Behind it">
            {pickMedium({
              medium: backside.exit,
              label: 'the medium behind the slab',
              onChange: (exit) => change({ ...backside, exit }, null),
            })}
          </Row>
          <p className="text-small text-muted">
            Reflections inside the slab add in intensity; there is then no amplitude r.
          </p>
        </div>
      )}
    </div>
  );
}

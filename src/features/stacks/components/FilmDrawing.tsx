import { useCallback, useMemo, useState } from 'react';
import type { ReactNode } from 'react';
import type { Issue } from '../../../../shared/error.ts';
import type { MaterialSummary } from '../../../../shared/material.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import type { MaterialAt } from '../hooks/useMaterials.ts';
import type { EditDocument } from '../hooks/useStackEditor.ts';
import type { Materials } from '../model/media.ts';
import { issueTarget } from '../model/issueTarget.ts';
import { Beam } from './Beam.tsx';
import type { KerrAngles } from './Beam.tsx';
import { CrossSection } from './CrossSection.tsx';
import { FilmCautions } from './FilmCautions.tsx';
import { FilmContext } from './film.ts';
import { IncidentMedium } from './IncidentMedium.tsx';

type Props = {
  document: StackDocument;
  materials: Materials;
  point: WorkingPoint;
  /** Change of the reflected polarization at that point, for its input light; null where it is not known. */
  kerr: KerrAngles | null;
  /** Lowest and highest wavelength that the page asks for, nm. */
  rangeNm: readonly [number, number];
  /** Issues of the server, with its paths. */
  issues?: readonly Issue[];
  /** What a layer can be made of, for the editor. */
  library?: readonly MaterialSummary[];
  /** Asks for a material in full, for the editor. */
  materialAt?: MaterialAt;
  edit: EditDocument | null;
  /** The layer that is pointed at elsewhere on the page. */
  activeLayer?: string | null;
  /** Below the layers, such as the settings of a real sample. */
  children?: ReactNode;
};

const noIssues: readonly Issue[] = [];
const noLibrary: readonly MaterialSummary[] = [];

/** The film as a drawing: the light, the layers, the substrate. With `edit` it is the editor, without it a picture. */
export function FilmDrawing(props: Props) {
  const { document, materials, point, kerr, rangeNm, edit } = props;
  const { issues = noIssues, library = noLibrary, materialAt = null } = props;
  const [said, setSaid] = useState('');
  const announce = useCallback((text: string) => setSaid(text), []);
  const [fromNm, toNm] = rangeNm;
  const itemIssues = useMemo(() => issuesByItem(document, issues), [document, issues]);
  const film = useMemo(
    () => ({
      materials,
      library,
      materialAt,
      edit,
      rangeNm: [fromNm, toNm] as const,
      issues: itemIssues,
      announce,
    }),
    [materials, library, materialAt, edit, fromNm, toNm, itemIssues, announce],
  );
  return (
    <FilmContext value={film}>
      <div className="relative">
        <div className="absolute top-0 left-0">
          <IncidentMedium
            incident={document.incident}
            wavelengthNm={point.wavelengthNm}
            input={point.input}
          />
        </div>
        <Beam angleDeg={point.angleDeg} input={point.input} kerr={kerr} />
        <span aria-hidden="true" className="absolute bottom-1.5 left-0 text-tick text-muted">
          nm
        </span>
      </div>
      <CrossSection document={document} activeLayer={props.activeLayer ?? null} />
      <FilmCautions document={document} />
      {props.children}
      <p role="status" className="sr-only">
        {said}
      </p>
    </FilmContext>
  );
}

const nothing: ReadonlyMap<string, readonly Issue[]> = new Map();

/** Issues at the item they name, each said once however many states and points repeat it. */
function issuesByItem(
  document: StackDocument,
  issues: readonly Issue[],
): ReadonlyMap<string, readonly Issue[]> {
  // The same map while there is nothing to say, so that the rows of a long film are not drawn at every keystroke.
  if (issues.length === 0) return nothing;
  const byItem = new Map<string, Issue[]>();
  for (const { path, message } of issues) {
    const target = issueTarget(document, path);
    if (target.place === 'page' || target.place === 'point') continue;
    const key = target.place === 'layer' ? target.id : target.place;
    const own = byItem.get(key) ?? [];
    if (own.some((issue) => issue.path === target.field && issue.message === message)) continue;
    byItem.set(key, [...own, { path: target.field, message }]);
  }
  return byItem;
}

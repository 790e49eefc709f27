import { useEffect, useId } from 'react';
import type { ReactNode } from 'react';
import { useLocation } from 'react-router-dom';
import type { Material } from '../../../shared/material.ts';
import { MaterialUsesPanel } from '../../features/materials/components/MaterialUsesPanel.tsx';
import { OriginPanel } from '../../features/materials/components/OriginPanel.tsx';
import { SourceList } from '../../features/materials/components/SourceList.tsx';
import { SpectrumCard } from '../../features/materials/components/SpectrumCard.tsx';
import { StoredContent } from '../../features/materials/components/StoredContent.tsx';
import { VersionList } from '../../features/materials/components/VersionList.tsx';

/** Curves, then what is stored on the left; sources, origin, versions and uses on the right. */
export function MaterialDetail({ material }: { material: Material }) {
  const { content, notes } = material;
  const { hash } = useLocation();
  // The address was there before what it points at.
  useEffect(() => {
    if (hash) document.getElementById(decodeURIComponent(hash.slice(1)))?.scrollIntoView();
  }, [hash]);
  const { origin } = content;
  return (
    <div className="grid grid-cols-1 items-start gap-4 lg:grid-cols-[1.5fr_1fr]">
      <div className="flex min-w-0 flex-col gap-4">
        <SpectrumCard material={material} />
        <Card title="What is stored">
          <StoredContent content={content} />
        </Card>
        {notes.length > 0 ? (
          <Card title="Notes">
            <ul className="flex max-w-prose list-disc flex-col gap-1.5 pl-5 text-muted">
              {notes.map((note) => (
                <li key={note}>{note}</li>
              ))}
            </ul>
          </Card>
        ) : null}
      </div>
      <div className="flex min-w-0 flex-col gap-4">
        <Card title="Where n and k come from">
          <SourceList source={content.indexSource} />
        </Card>
        {content.anisotropySource ? (
          <Card title="Where the crystal constants come from">
            <SourceList source={content.anisotropySource} />
          </Card>
        ) : null}
        {content.voigtSource ? (
          <Card title="Where Q comes from">
            <SourceList source={content.voigtSource} />
          </Card>
        ) : null}
        {origin?.index || origin?.voigt ? (
          <Card title="How it was imported">
            <OriginPanel origin={origin} />
          </Card>
        ) : null}
        <Card title="Versions" anchor="history">
          <VersionList materialId={material.id} shown={material.version} />
        </Card>
        <Card title="Where it is used">
          <MaterialUsesPanel materialId={material.id} />
        </Card>
      </div>
    </div>
  );
}

/** @param anchor under which links lead here */
function Card({ title, anchor, children }: { title: string; anchor?: string; children: ReactNode }) {
  const id = useId();
  return (
    <section id={anchor} aria-labelledby={id} className="card min-w-0 scroll-mt-4 px-4 py-3.5">
      <h2 id={id} className="mb-2 text-body">
        {title}
      </h2>
      {children}
    </section>
  );
}

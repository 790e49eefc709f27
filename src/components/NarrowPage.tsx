import type { ReactNode } from 'react';
import { useDocumentTitle } from './Page.tsx';

/** The frame of the small forms around signing in. */
export function NarrowPage({ title, children }: { title: string; children: ReactNode }) {
  useDocumentTitle(title);
  return (
    <div className="mx-auto flex max-w-[420px] flex-col gap-4 px-4 pt-8 pb-16 sm:pt-14">
      <h1 className="text-title">{title}</h1>
      {children}
    </div>
  );
}

import { useEffect } from 'react';
import type { ReactNode } from 'react';

/** Sets the title of the browser's tab while the component is on screen. */
export function useDocumentTitle(title: string): void {
  useEffect(() => {
    document.title = title === 'Skewlight' ? title : `${title} · Skewlight`;
  }, [title]);
}

type PageProps = {
  title: string;
  subtitle?: ReactNode;
  /** Stands right of the title: the one primary button and its neighbours. */
  actions?: ReactNode;
  width?: 'wide' | 'text';
  children: ReactNode;
};

/** The frame of every screen but the stack page: title, quiet line under it, content. */
export function Page({ title, subtitle, actions, width = 'wide', children }: PageProps) {
  useDocumentTitle(title);
  return (
    <div
      className={`mx-auto px-4 pt-5 pb-12 sm:px-6 ${width === 'wide' ? 'max-w-[1280px]' : 'max-w-[820px]'}`}
    >
      <div className="mb-5 flex flex-wrap items-end gap-x-4 gap-y-3">
        <div className="min-w-0 flex-1 max-sm:basis-full">
          <h1 className="text-title wrap-break-word">{title}</h1>
          {subtitle ? <div className="mt-0.5 text-note text-muted">{subtitle}</div> : null}
        </div>
        {actions ? <div className="flex flex-wrap items-center gap-2">{actions}</div> : null}
      </div>
      {children}
    </div>
  );
}

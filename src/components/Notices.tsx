import { X } from 'lucide-react';
import { createContext, use, useCallback, useMemo, useState } from 'react';
import type { ReactNode } from 'react';
import { IconButton } from './Button.tsx';

type Notice = { id: number; tone: 'done' | 'problem'; text: string };

type Notify = {
  /** Says that something was done; goes away by itself. */
  done: (text: string) => void;
  /** Says that something failed; stays until it is closed. */
  problem: (text: string) => void;
};

const NotifyContext = createContext<Notify>({ done: () => undefined, problem: () => undefined });

const secondsShown = 6;
let lastId = 0;

/** For results that have no place of their own on the page. A failure at a field belongs at the field. */
export function useNotify(): Notify {
  return use(NotifyContext);
}

export function NoticeProvider({ children }: { children: ReactNode }) {
  const [notices, setNotices] = useState<Notice[]>([]);
  const close = useCallback(
    (id: number) => setNotices((open) => open.filter((notice) => notice.id !== id)),
    [],
  );
  const notify = useMemo<Notify>(() => {
    const add = (tone: Notice['tone'], text: string) => {
      const id = ++lastId;
      setNotices((open) => [...open.slice(-2), { id, tone, text }]);
      if (tone === 'done') setTimeout(() => close(id), secondsShown * 1000);
    };
    return { done: (text) => add('done', text), problem: (text) => add('problem', text) };
  }, [close]);

  return (
    <NotifyContext value={notify}>
      {children}
      <div
        data-screen-only
        role="status"
        aria-live="polite"
        className="fixed bottom-4 left-1/2 z-50 flex w-[min(440px,calc(100vw-32px))] -translate-x-1/2 flex-col gap-2"
      >
        {notices.map((notice) => (
          <div
            key={notice.id}
            className={`card flex items-center gap-3 py-2 pr-2 pl-4 shadow-float ${notice.tone === 'problem' ? 'border-danger! text-danger' : ''}`}
          >
            <span className="flex-1">{notice.text}</span>
            <IconButton label="Close this message" onClick={() => close(notice.id)}>
              <X aria-hidden="true" className="size-4" />
            </IconButton>
          </div>
        ))}
      </div>
    </NotifyContext>
  );
}

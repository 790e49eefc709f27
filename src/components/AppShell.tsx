import type { ReactNode } from 'react';
import { Link, NavLink } from 'react-router-dom';
import { Mark } from './Mark.tsx';

type ShellLink = {
  to: string;
  label: string;
  /** Whether only the exact address counts as here. */
  exact?: boolean;
  /** For what stands at the right where there is room, and in the row of links where there is not. */
  narrowOnly?: boolean;
};

type AppShellProps = {
  home: string;
  links: readonly ShellLink[];
  /** Group switcher, conventions, person menu; or the way to sign in. */
  right: ReactNode;
  /** A line over the page when answers stay away. */
  banner?: ReactNode;
  children: ReactNode;
};

/** The header of every page and the frame under it. The first stop of the keyboard leads past the header. */
export function AppShell({ home, links, right, banner, children }: AppShellProps) {
  return (
    <div className="flex min-h-dvh flex-col">
      <a
        href="#content"
        data-screen-only
        className="fixed top-2 left-2 z-50 -translate-y-20 rounded-control bg-accent px-4 py-2 font-semibold text-on-accent focus:translate-y-0"
      >
        Skip to content
      </a>
      <header
        data-screen-only
        className="flex min-h-[52px] flex-wrap items-center gap-x-6 border-b border-line px-4 sm:px-6 print:hidden"
      >
        <Link
          to={home}
          className="flex h-[52px] items-center gap-2 text-[17px] font-[640] tracking-[-0.01em] text-ink no-underline"
        >
          <Mark />
          Skewlight
        </Link>
        {links.length > 0 ? (
          <nav
            aria-label="Main"
            className="flex gap-5 max-md:gap-[min(14px,2.6vw)] max-md:text-[min(14px,3.5vw)] max-md:overflow-x-auto max-md:order-last max-md:h-10 max-md:w-full max-md:items-start"
          >
            {links.map((link) => (
              <NavLink
                key={link.label}
                to={link.to}
                end={link.exact ?? false}
                className={({ isActive }) =>
                  `py-1 no-underline hover:text-ink ${link.narrowOnly ? 'md:hidden' : ''} ${isActive ? 'font-semibold text-ink' : 'text-muted'}`
                }
              >
                {link.label}
              </NavLink>
            ))}
          </nav>
        ) : null}
        <div className="ml-auto flex min-w-0 items-center gap-1 text-muted sm:gap-2">{right}</div>
      </header>
      {banner}
      <main id="content" tabIndex={-1} className="flex-1 outline-none">
        {children}
      </main>
    </div>
  );
}

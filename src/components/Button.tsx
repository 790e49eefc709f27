import type { ComponentProps, ReactNode } from 'react';
import { Link } from 'react-router-dom';

/** `primary` stands once on a screen; `quiet` has an edge, `plain` has none; `danger` destroys something. */
type ButtonTone = 'primary' | 'quiet' | 'plain' | 'danger';

const shape =
  'inline-flex items-center justify-center gap-1.5 rounded-control px-3.5 py-[7px] text-body leading-[1.35] whitespace-nowrap no-underline transition-colors disabled:cursor-not-allowed disabled:opacity-55 aria-disabled:opacity-55';

const tones: Record<ButtonTone, string> = {
  primary: 'bg-accent text-on-accent font-semibold border border-accent enabled:hover:opacity-90',
  quiet:
    'border border-edge bg-panel text-ink font-medium enabled:hover:bg-accent-soft [a&]:hover:bg-accent-soft',
  plain:
    'border border-transparent text-accent font-medium enabled:hover:bg-accent-soft [a&]:hover:bg-accent-soft',
  danger: 'border border-danger font-semibold bg-panel text-danger enabled:hover:bg-danger-soft',
};

type Look = { tone?: ButtonTone; icon?: ReactNode };

/** A button. `busy` keeps it focusable, says so to screen readers and ignores further presses. */
export function Button({
  tone = 'quiet',
  icon,
  busy = false,
  className = '',
  children,
  onClick,
  type = 'button',
  ...rest
}: ComponentProps<'button'> & Look & { busy?: boolean }) {
  return (
    <button
      {...rest}
      type={type}
      aria-busy={busy || undefined}
      aria-disabled={busy || undefined}
      className={`${shape} ${tones[tone]} ${className}`}
      onClick={(event) => {
        if (busy) event.preventDefault();
        else onClick?.(event);
      }}
    >
      {icon}
      {children}
    </button>
  );
}

/** A link that looks like a button, for going somewhere. */
export function ButtonLink({
  tone = 'quiet',
  icon,
  className = '',
  children,
  ...rest
}: ComponentProps<typeof Link> & Look) {
  return (
    <Link {...rest} className={`${shape} ${tones[tone]} ${className}`}>
      {icon}
      {children}
    </Link>
  );
}

/** A button that is only an icon; `label` is its name and its tooltip. */
export function IconButton({
  label,
  className = '',
  type = 'button',
  children,
  ...rest
}: Omit<ComponentProps<'button'>, 'aria-label' | 'title'> & { label: string }) {
  return (
    <button
      {...rest}
      type={type}
      aria-label={label}
      title={label}
      className={`inline-flex size-8 items-center justify-center rounded-control border border-transparent text-muted enabled:hover:bg-accent-soft enabled:hover:text-accent disabled:opacity-45 ${className}`}
    >
      {children}
    </button>
  );
}

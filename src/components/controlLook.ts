/** The one look of text fields and selects. */
export const controlLook =
  'w-full rounded-control border border-edge bg-panel px-3 py-[7px] text-body text-ink aria-invalid:border-danger disabled:bg-paper disabled:text-muted';

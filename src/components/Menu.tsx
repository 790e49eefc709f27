import { Check } from 'lucide-react';
import { DropdownMenu as Radix } from 'radix-ui';
import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';

export type MenuItem =
  | {
      kind: 'action';
      label: string;
      icon?: ReactNode;
      danger?: boolean;
      disabled?: boolean;
      onSelect: () => void;
    }
  | { kind: 'link'; label: string; icon?: ReactNode; to: string; current?: boolean }
  | { kind: 'choice'; label: string; checked: boolean; onSelect: () => void }
  | { kind: 'heading'; label: string }
  | { kind: 'separator'; id: string };

type MenuProps = {
  /** The button that opens the menu; it receives the props of the trigger. */
  trigger: ReactNode;
  items: readonly MenuItem[];
  align?: 'start' | 'end';
};

const itemLook =
  'flex items-center gap-2 rounded-box px-2.5 py-1.5 text-body text-ink no-underline outline-none data-[highlighted]:bg-accent-soft data-[highlighted]:text-accent data-[disabled]:opacity-50';

export function Menu({ trigger, items, align = 'end' }: MenuProps) {
  return (
    <Radix.Root modal={false}>
      <Radix.Trigger asChild>{trigger}</Radix.Trigger>
      <Radix.Portal>
        <Radix.Content align={align} sideOffset={6} className="card z-50 min-w-48 p-1.5 shadow-float">
          {items.map((item) => (
            <Item key={item.kind === 'separator' ? item.id : `${item.kind} ${item.label}`} item={item} />
          ))}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}

function Item({ item }: { item: MenuItem }) {
  switch (item.kind) {
    case 'action':
      return (
        <Radix.Item
          disabled={item.disabled ?? false}
          onSelect={item.onSelect}
          className={`${itemLook} ${item.danger ? 'text-danger!' : ''}`}
        >
          {item.icon}
          {item.label}
        </Radix.Item>
      );
    case 'link':
      return (
        <Radix.Item asChild>
          <Link to={item.to} aria-current={item.current ? 'true' : undefined} className={itemLook}>
            {item.icon}
            <span className="flex-1">{item.label}</span>
            {item.current ? <Check aria-hidden="true" className="size-4" /> : null}
          </Link>
        </Radix.Item>
      );
    case 'choice':
      return (
        <Radix.CheckboxItem checked={item.checked} onSelect={item.onSelect} className={itemLook}>
          <span className="flex-1">{item.label}</span>
          <Radix.ItemIndicator>
            <Check aria-hidden="true" className="size-4" />
          </Radix.ItemIndicator>
        </Radix.CheckboxItem>
      );
    case 'heading':
      return <Radix.Label className="px-2.5 pt-1.5 pb-1 text-small text-muted">{item.label}</Radix.Label>;
    case 'separator':
      return <Radix.Separator className="my-1.5 h-px bg-line" />;
  }
}

// A list of things to do, opened by a button.
import { DropdownMenu } from 'radix-ui';
import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';

export interface MenuProps {
  /** The button that opens it; takes a ref. */
  readonly trigger: ReactNode;
  readonly align?: 'start' | 'end';
  readonly children: ReactNode;
}

export function Menu({ trigger, align = 'end', children }: MenuProps) {
  return (
    <DropdownMenu.Root modal={false}>
      <DropdownMenu.Trigger asChild>{trigger}</DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content align={align} sideOffset={6} collisionPadding={8} className="on-card cut menu">
          {children}
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  );
}

export interface MenuItemProps {
  readonly onSelect: () => void;
  readonly danger?: boolean;
  readonly disabled?: boolean;
  readonly children: ReactNode;
}

export const MenuItem = ({ onSelect, danger = false, disabled = false, children }: MenuItemProps) => (
  <DropdownMenu.Item className="menu-item" disabled={disabled} data-danger={danger || undefined} onSelect={onSelect}>
    {children}
  </DropdownMenu.Item>
);

export const MenuLink = ({ to, children }: { readonly to: string; readonly children: ReactNode }) => (
  <DropdownMenu.Item asChild className="menu-item">
    <Link to={to}>{children}</Link>
  </DropdownMenu.Item>
);

export const MenuRule = () => <DropdownMenu.Separator className="my-2 border-t border-dashed border-line" />;

export const MenuLabel = ({ children }: { readonly children: ReactNode }) => (
  <DropdownMenu.Label className="px-4 pt-1 pb-1.5 text-sm text-soft">{children}</DropdownMenu.Label>
);

import type { ReactNode } from 'react';
import { Check } from 'lucide-react';
import { DropdownMenu as Radix } from 'radix-ui';
import { joinClasses } from '../../lib/join-classes.ts';

interface MenuProps {
  /** The button that opens it. */
  trigger: ReactNode;
  align?: 'start' | 'end';
  side?: 'top' | 'bottom';
  children: ReactNode;
}

const itemStyle =
  'flex min-h-11 w-full items-center gap-3 rounded-md px-3 py-2 text-left text-ink no-underline ' +
  'outline-none data-[highlighted]:bg-teal-wash data-[disabled]:opacity-50 [&>svg]:size-5 [&>svg]:shrink-0';

/** A menu under a button. */
export function Menu({ trigger, align = 'end', side = 'bottom', children }: MenuProps) {
  return (
    <Radix.Root>
      <Radix.Trigger asChild>{trigger}</Radix.Trigger>
      <Radix.Portal>
        <Radix.Content
          align={align}
          side={side}
          sideOffset={6}
          collisionPadding={8}
          className="z-50 max-h-[70dvh] min-w-56 overflow-y-auto rounded-lg border border-line bg-paper-raised p-1.5 shadow-lg"
        >
          {children}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}

interface MenuItemProps {
  onSelect?: () => void;
  disabled?: boolean;
  tone?: 'normal' | 'danger';
  /** With this the only child is a link and is the item. */
  asChild?: boolean;
  children: ReactNode;
}

/** One thing to do; wrap a link with `asChild`. */
export function MenuItem({
  onSelect,
  disabled = false,
  tone = 'normal',
  asChild = false,
  children,
}: MenuItemProps) {
  return (
    <Radix.Item
      asChild={asChild}
      disabled={disabled}
      onSelect={() => onSelect?.()}
      className={joinClasses(itemStyle, tone === 'danger' && 'text-rust-strong')}
    >
      {children}
    </Radix.Item>
  );
}

interface MenuCheckProps {
  checked: boolean;
  onCheckedChange: (checked: boolean) => void;
  children: ReactNode;
}

/** Something that is on or off; the menu stays open. */
export function MenuCheck({ checked, onCheckedChange, children }: MenuCheckProps) {
  return (
    <Radix.CheckboxItem
      checked={checked}
      onCheckedChange={onCheckedChange}
      onSelect={(event) => event.preventDefault()}
      className={itemStyle}
    >
      <span aria-hidden className="flex size-5 items-center justify-center text-teal">
        <Radix.ItemIndicator>
          <Check className="size-5" />
        </Radix.ItemIndicator>
      </span>
      {children}
    </Radix.CheckboxItem>
  );
}

/** A line of words in a menu that does nothing. */
export function MenuLabel({ children }: { children: ReactNode }) {
  return <Radix.Label className="px-3 py-1.5 text-sm text-ink-faint">{children}</Radix.Label>;
}

/** A rule between groups. */
export function MenuLine() {
  return <Radix.Separator className="my-1.5 h-px bg-line" />;
}

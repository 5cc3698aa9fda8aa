import { Check } from 'lucide-react';
import { DropdownMenu as Primitive } from 'radix-ui';
import type { ReactNode } from 'react';

const ITEM =
  'flex min-h-8 w-full items-center gap-3 px-3 outline-none select-none data-highlighted:bg-ink data-highlighted:text-sheet';

interface MenuProps {
  /** One element that takes a ref: the button that opens the menu. */
  readonly trigger: ReactNode;
  readonly align?: 'start' | 'end';
  readonly children: ReactNode;
}

export function Menu({ trigger, align = 'end', children }: MenuProps) {
  return (
    <Primitive.Root modal={false}>
      <Primitive.Trigger asChild>{trigger}</Primitive.Trigger>
      <Primitive.Portal>
        <Primitive.Content
          align={align}
          sideOffset={6}
          collisionPadding={8}
          // What was chosen may have put the focus where it is wanted, which the closing menu would take back.
          onCloseAutoFocus={(event) => {
            if (document.activeElement !== document.body) event.preventDefault();
          }}
          className="z-50 max-w-[min(20rem,calc(100vw-1rem))] min-w-52 border border-ink bg-sheet py-1.5"
        >
          {children}
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  );
}

export function MenuItem({ onSelect, children }: { readonly onSelect: () => void; readonly children: ReactNode }) {
  return (
    <Primitive.Item className={ITEM} onSelect={onSelect}>
      {children}
    </Primitive.Item>
  );
}

interface MenuChoiceProps<Value extends string> {
  readonly label: string;
  readonly value: Value;
  readonly options: readonly { readonly value: Value; readonly text: string }[];
  readonly onChange: (value: Value) => void;
}

/** One of several, as a group of a menu; choosing keeps the menu open, so that the effect is seen. */
export function MenuChoice<Value extends string>({ label, value, options, onChange }: MenuChoiceProps<Value>) {
  return (
    <>
      <Primitive.Label className="px-3 pt-1.5 pb-1 text-xs text-faint">{label}</Primitive.Label>
      <Primitive.RadioGroup
        value={value}
        onValueChange={(chosen) => {
          const option = options.find((one) => one.value === chosen);
          if (option !== undefined) onChange(option.value);
        }}
      >
        {options.map((option) => (
          <Primitive.RadioItem
            key={option.value}
            value={option.value}
            className={ITEM}
            onSelect={(event) => event.preventDefault()}
          >
            <span className="flex size-4 shrink-0 items-center">
              <Primitive.ItemIndicator>
                <Check size={16} strokeWidth={1.5} aria-hidden />
              </Primitive.ItemIndicator>
            </span>
            <span className="truncate">{option.text}</span>
          </Primitive.RadioItem>
        ))}
      </Primitive.RadioGroup>
    </>
  );
}

export function MenuLine() {
  return <Primitive.Separator className="my-1.5 h-px bg-rule" />;
}

/** Words in a menu that are no choice. */
export function MenuNote({ children }: { readonly children: ReactNode }) {
  return <Primitive.Label className="px-3 py-1.5">{children}</Primitive.Label>;
}

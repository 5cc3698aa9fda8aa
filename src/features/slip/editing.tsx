import { createContext, type FocusEvent, type ReactNode, useContext, useEffect, useRef } from 'react';
import type { FieldEditor } from '../../live/presence';

/** Who else is at values of the part whose slip this is. */
export const Editors = createContext<readonly FieldEditor[]>([]);

/** Handlers for the slip that tell which value is being edited in it, by the name that `EditedValue` gives it. */
export function useEditing(onEditing: ((field: string | undefined) => void) | undefined) {
  const tell = useRef(onEditing);
  useEffect(() => {
    tell.current = onEditing;
  });
  useEffect(() => () => tell.current?.(undefined), []);
  return {
    onFocus: ({ target }: FocusEvent) => onEditing?.(target.closest<HTMLElement>('[data-value]')?.dataset.value),
    onBlur: ({ relatedTarget, currentTarget }: FocusEvent) => {
      if (!currentTarget.contains(relatedTarget)) onEditing?.(undefined);
    },
  };
}

/** A row of the slip's grid that is about one value: its name, the value, and the initials of whoever else is at it. */
export function EditedValue({ name, children }: { name: string; children: ReactNode }) {
  const here = useContext(Editors).filter(({ field }) => field === name);
  return (
    <div data-value={name} className="contents">
      {children}
      <span className="relative self-center">
        {here.length > 0 && (
          <span className="-translate-y-1/2 absolute top-1/2 right-0 flex gap-0.5 bg-sheet pl-1">
            {here.map((person) => (
              <span
                key={person.id}
                title={`${person.name} is at this value`}
                className="border border-focus px-0.5 text-focus leading-4"
              >
                {person.initials}
                <span className="sr-only"> {person.name} is at this value</span>
              </span>
            ))}
          </span>
        )}
      </span>
    </div>
  );
}

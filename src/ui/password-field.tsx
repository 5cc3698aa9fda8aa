import { type ComponentProps, useState } from 'react';
import { Button } from './button';
import { TextField } from './field';

/** A password that can be shown while it is typed; `autoComplete` tells password managers which one it is. */
export function PasswordField(
  props: Omit<ComponentProps<typeof TextField>, 'type' | 'after'> & {
    readonly autoComplete: 'current-password' | 'new-password';
  },
) {
  const [shown, setShown] = useState(false);
  return (
    <TextField
      {...props}
      type={shown ? 'text' : 'password'}
      spellCheck={false}
      autoCapitalize="none"
      after={
        <Button
          aria-pressed={shown}
          aria-label="Show password"
          className="w-16 text-xs"
          onClick={() => setShown(!shown)}
        >
          {shown ? 'hide' : 'show'}
        </Button>
      }
    />
  );
}

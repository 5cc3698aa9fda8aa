import { useEffect, useRef } from 'react';
import type { Invitation } from '#shared/api/invitations';
import { Button } from '../../ui/button';
import { TextField } from '../../ui/field';
import { useStatus } from '../../ui/status';

interface NewLinkProps {
  readonly link: string;
  readonly invitation: Invitation;
}

/** A link just made, to be copied: the server keeps only its hash and cannot show it again. */
export function NewLink({ link, invitation }: NewLinkProps) {
  const { say } = useStatus();
  const field = useRef<HTMLInputElement>(null);
  useEffect(() => {
    field.current?.focus();
    field.current?.select();
  }, []);
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(link);
      say('The link is on the clipboard. Send it to one person.');
    } catch {
      // Without TLS, or when refused, there is no clipboard: the text is selected for the person to copy.
      field.current?.select();
      say('The browser did not let the page copy. The link is selected: copy it by key.');
    }
  };
  return (
    <div className="mt-4">
      <TextField
        ref={field}
        label="Invitation link"
        readOnly
        value={link}
        onFocus={(event) => event.target.select()}
        hint={`For one ${invitation.role}, for seven days. It is shown only now: copy it before you go on.`}
        after={<Button onClick={copy}>Copy</Button>}
      />
    </div>
  );
}

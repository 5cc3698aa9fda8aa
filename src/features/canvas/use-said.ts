import { useCallback, useState } from 'react';

/** A message that is read out and stays beside the tray until the next thing is done. */
export function useSaid(announce: (message: string) => void) {
  const [said, setSaid] = useState('');
  const say = useCallback(
    (message: string) => {
      setSaid(message);
      announce(message);
    },
    [announce],
  );
  const hush = useCallback(() => setSaid(''), []);
  return { said, say, hush };
}

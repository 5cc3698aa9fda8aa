import { Menu as MenuLines } from 'lucide-react';
import { useEffect, useState } from 'react';
import { useSession, useSignOut } from '../../api/session';
import { Menu, MenuChoice, MenuItem, MenuLine, MenuNote } from '../../ui/menu';
import { useStatus } from '../../ui/status';
import { chooseTheme, chosenTheme, type Theme } from '../../ui/theme';

const THEME_TEXTS: readonly { readonly value: Theme; readonly text: string }[] = [
  { value: 'system', text: 'as the system' },
  { value: 'light', text: 'light' },
  { value: 'dark', text: 'dark' },
];

/** Who is signed in, how the pages look to them, and the way out. */
export function PersonMenu() {
  const { person } = useSession();
  const { warn } = useStatus();
  const signOut = useSignOut();
  const [theme, setTheme] = useState(chosenTheme);
  useEffect(() => {
    if (signOut.error) warn(`You are still signed in. ${signOut.error.message}`);
  }, [signOut.error, warn]);
  return (
    <Menu
      trigger={
        <button
          type="button"
          aria-label={`${person.name}, your menu`}
          className="-mr-1 flex h-8 min-w-8 items-center justify-center gap-2 px-1 hover:text-faint"
        >
          {/* No initials: those stand for who is on a sheet now. */}
          <span className="hidden max-w-40 truncate xl:block">{person.name}</span>
          <MenuLines size={18} strokeWidth={1.5} aria-hidden />
        </button>
      }
    >
      <MenuNote>
        <span className="block truncate">{person.name}</span>
        <span className="block truncate text-xs text-faint">{person.email}</span>
      </MenuNote>
      <MenuLine />
      <MenuChoice
        label="Theme"
        value={theme}
        options={THEME_TEXTS}
        onChange={(chosen) => {
          setTheme(chosen);
          chooseTheme(chosen);
        }}
      />
      <MenuLine />
      <MenuItem onSelect={() => signOut.mutate()}>Sign out</MenuItem>
    </Menu>
  );
}

import { Fragment } from 'react';
import { MenuItem, MenuLine } from '../../ui/menu';
import { MenuAt } from '../../ui/menu-at';
import { ACTIONS } from './actions';
import type { Desk } from './desk';

type ActionsMenuProps = {
  readonly at: { readonly x: number; readonly y: number } | undefined;
  readonly desk: Desk;
  readonly onClose: () => void;
};

/** All that can be done now with what is selected, with its keys. */
export function ActionsMenu({ at, desk, onClose }: ActionsMenuProps) {
  const groups = ACTIONS.map((group) => group.filter(({ can }) => can(desk))).filter((group) => group.length > 0);
  return (
    <MenuAt at={at} label="Actions" onClose={onClose} onFocusBack={desk.focusDrawing}>
      {groups.map((group, index) => (
        <Fragment key={group[0]?.label}>
          {index > 0 && <MenuLine />}
          {group.map(({ label, keys, act }) => (
            <MenuItem key={label} onSelect={() => act(desk)}>
              <span>{label}</span>
              <kbd className="ml-auto pl-6 opacity-70 pointer-coarse:hidden">{keys}</kbd>
            </MenuItem>
          ))}
        </Fragment>
      ))}
    </MenuAt>
  );
}

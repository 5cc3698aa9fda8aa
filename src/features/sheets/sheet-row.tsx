import { Ellipsis } from 'lucide-react';
import { useRef, useState } from 'react';
import { Link } from 'react-router-dom';
import type { ListedSheet, SheetState } from '#shared/api/sheets';
import { useSession } from '../../api/session';
import { initialsOf } from '../../formats/initials';
import { Initials } from '../../ui/initials';
import { Menu, MenuItem } from '../../ui/menu';
import { Cell } from '../../ui/table';
import { When } from '../../ui/when';
import { RenameField } from './rename-field';
import { WorstDevice } from './sheet-standing';

const STATE_TEXTS: Record<SheetState, string> = {
  draft: 'draft',
  'in-review': 'in review',
  'signed-off': 'signed off',
  changed: 'changed since sign-off',
};

/** What may be done with a sheet from the list, each only where the reader may do it. */
export interface SheetActions {
  readonly rename: boolean;
  readonly copy: ((sheet: ListedSheet) => void) | undefined;
  readonly archive: ((sheet: ListedSheet) => void) | undefined;
  readonly bringBack: ((sheet: ListedSheet) => void) | undefined;
}

interface SheetRowProps {
  readonly sheet: ListedSheet;
  /** Of the worst device in millivolts, in line with the other rows. */
  readonly margin: string;
  readonly actions: SheetActions;
  readonly hasActions: boolean;
}

/** One sheet of the list. */
export function SheetRow({ sheet, margin, actions, hasActions }: SheetRowProps) {
  const [renaming, setRenaming] = useState(false);
  const menu = useRef<HTMLButtonElement>(null);
  const { standing } = sheet;
  return (
    <tr className="align-top">
      <Cell className="w-full max-w-0">
        {renaming ? (
          <RenameField
            sheet={sheet}
            onDone={(byKey) => {
              setRenaming(false);
              if (byKey) menu.current?.focus();
            }}
          />
        ) : (
          <Link to={`/sheets/${sheet.id}`} className="block font-bold wrap-anywhere hover:underline">
            {sheet.name}
          </Link>
        )}
        <span className="block text-xs text-faint">
          {STATE_TEXTS[sheet.state]}, begun by {sheet.createdBy}
        </span>
        {/* Where there is no room for every column, what the others hold stands under the name. */}
        <div className="mt-1 flex flex-col gap-1 xl:hidden">
          <div className="text-xs">
            <WorstDevice standing={standing} />
          </div>
          <div className="flex flex-wrap items-center gap-x-3 gap-y-1 text-xs text-faint sm:hidden">
            <When at={sheet.changedAt} />
            {standing !== null && standing.fets > 0 && (
              <span>{standing.fets === 1 ? '1 FET' : `${standing.fets} FETs`}</span>
            )}
            <PeopleHere sheet={sheet} />
          </div>
        </div>
      </Cell>
      <Cell className="hidden text-right sm:table-cell">{standing?.fets ?? '–'}</Cell>
      <Cell className="hidden min-w-72 xl:table-cell">
        <WorstDevice standing={standing} />
      </Cell>
      <Cell className="hidden text-right whitespace-nowrap xl:table-cell">{margin}</Cell>
      <Cell className="hidden sm:table-cell">
        <PeopleHere sheet={sheet} />
      </Cell>
      <Cell className="hidden sm:table-cell">
        <When at={sheet.changedAt} />
      </Cell>
      {hasActions && (
        <Cell className="w-8 text-right">
          <Menu
            trigger={
              <button
                ref={menu}
                type="button"
                aria-label={`What to do with ${sheet.name}`}
                className="-my-1 inline-flex size-8 items-center justify-center hover:text-faint"
              >
                <Ellipsis size={18} strokeWidth={1.5} aria-hidden />
              </button>
            }
          >
            {actions.rename && <MenuItem onSelect={() => setRenaming(true)}>Rename</MenuItem>}
            {actions.copy && <MenuItem onSelect={() => actions.copy?.(sheet)}>Make a copy</MenuItem>}
            {actions.archive && <MenuItem onSelect={() => actions.archive?.(sheet)}>Archive</MenuItem>}
            {actions.bringBack && <MenuItem onSelect={() => actions.bringBack?.(sheet)}>Bring back</MenuItem>}
          </Menu>
        </Cell>
      )}
    </tr>
  );
}

function PeopleHere({ sheet }: { readonly sheet: ListedSheet }) {
  const { person } = useSession();
  if (sheet.here.length === 0) return null;
  return (
    <ul aria-label={`Here now: ${sheet.name}`} className="flex flex-wrap gap-1">
      {sheet.here.map(({ id, name }) => (
        <li key={id} title={name}>
          <Initials text={initialsOf(name)} own={id === person.id} />
          <span className="sr-only">{name}</span>
        </li>
      ))}
    </ul>
  );
}

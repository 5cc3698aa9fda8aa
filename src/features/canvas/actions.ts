import type { KeyboardEvent } from 'react';
import { isComponent } from '#shared/circuit/drawing';
import { matchOf } from '#shared/circuit/match-group';
import { duplicate } from './copies';
import { type Desk, selectedParts } from './desk';
import { hasSlip, mirrorSelected, removeSelected, turnSelected } from './part-keys';
import { canPasteByMenu, copyByMenu, pasteByMenu } from './use-clipboard';

/** Something that can be done by a key and from the menu alike. */
export type Action = {
  readonly label: string;
  /** As a person reads it. */
  readonly keys: string;
  /** The key that does it while the drawing has the focus, where no other handler has it already. */
  readonly key?: { readonly key: string; readonly command?: true; readonly shift?: true };
  /** Only what can be done now is shown. */
  can(desk: Desk): boolean;
  act(desk: Desk): void;
};

const canEdit = ({ commands }: Desk) => commands.canEdit;
const some = (desk: Desk) => desk.selection.parts.size > 0;
const editable = (desk: Desk) => canEdit(desk) && some(desk);
const several = (desk: Desk) => canEdit(desk) && desk.selection.parts.size > 1;

/** In groups, as the menu has them. */
export const ACTIONS: readonly (readonly Action[])[] = [
  [
    {
      label: 'Values of the selected parts',
      keys: 'Enter',
      can: (desk) => selectedParts(desk).some(hasSlip),
      act: (desk) => {
        const part = selectedParts(desk).find(hasSlip);
        if (part) desk.openSlip(part.id);
      },
    },
  ],
  [
    { label: 'Copy', keys: 'Ctrl C', can: some, act: (desk) => void copyByMenu(desk, false) },
    { label: 'Cut', keys: 'Ctrl X', can: editable, act: (desk) => void copyByMenu(desk, true) },
    {
      label: 'Paste',
      keys: 'Ctrl V',
      can: (desk) => canEdit(desk) && canPasteByMenu(),
      act: (desk) => void pasteByMenu(desk),
    },
    { label: 'Duplicate', keys: 'd', key: { key: 'd' }, can: editable, act: (desk) => duplicate(desk, false) },
    {
      label: 'Duplicate as a mirror image',
      keys: 'm',
      key: { key: 'm' },
      can: editable,
      act: (desk) => duplicate(desk, true),
    },
  ],
  [
    { label: 'Turn left', keys: '[', can: editable, act: (desk) => void turnSelected(desk, -1) },
    { label: 'Turn right', keys: ']', can: editable, act: (desk) => void turnSelected(desk, 1) },
    { label: 'Mirror left for right', keys: '=', can: editable, act: (desk) => void mirrorSelected(desk) },
    {
      label: 'Align and space',
      keys: 's',
      key: { key: 's' },
      can: several,
      act: (desk) => desk.show('alignments'),
    },
  ],
  [
    {
      label: 'Keep values equal',
      keys: 'k',
      key: { key: 'k' },
      can: (desk) => several(desk) && oneKind(desk) && !oneGroup(desk),
      act: keepEqual,
    },
    {
      label: 'Keep values equal no longer',
      keys: 'k',
      key: { key: 'k' },
      can: (desk) => editable(desk) && oneGroup(desk),
      act: letApart,
    },
    {
      label: 'Renumber column by column',
      keys: 'o',
      key: { key: 'o' },
      can: (desk) => canEdit(desk) && desk.geometry.parts.size > 0,
      act: (desk) => renumber(desk, 'columns'),
    },
    {
      label: 'Renumber row by row',
      keys: 'Shift O',
      key: { key: 'o', shift: true },
      can: (desk) => canEdit(desk) && desk.geometry.parts.size > 0,
      act: (desk) => renumber(desk, 'rows'),
    },
  ],
  [
    {
      label: 'Select all',
      keys: 'Ctrl A',
      key: { key: 'a', command: true },
      can: (desk) => desk.geometry.parts.size > 0,
      act: selectAll,
    },
    {
      label: 'Find a part or a net',
      keys: 'f',
      key: { key: 'f' },
      can: (desk) => desk.geometry.parts.size > 0,
      act: (desk) => desk.show('find'),
    },
    {
      label: 'Remove',
      keys: 'Delete',
      can: (desk) => canEdit(desk) && desk.selection.parts.size + desk.selection.wires.size > 0,
      act: (desk) => void removeSelected(desk),
    },
  ],
];

/** Does what a key stands for; whether there was anything. */
export function actByKey(event: KeyboardEvent, desk: Desk): boolean {
  const command = event.ctrlKey || event.metaKey;
  const action = ACTIONS.flat().find(
    ({ key, can }) =>
      key?.key === event.key.toLowerCase() &&
      (key.command ?? false) === command &&
      (key.shift ?? false) === event.shiftKey &&
      can(desk),
  );
  action?.act(desk);
  return action !== undefined;
}

function selectAll(desk: Desk): void {
  const parts = new Set(desk.geometry.parts.keys());
  desk.select({ parts, wires: new Set(desk.geometry.routes.keys()) });
  desk.announce(`Selected all ${parts.size} parts.`);
}

function oneKind(desk: Desk): boolean {
  const parts = selectedParts(desk);
  return parts.every((part) => isComponent(part) && part.kind === parts[0]?.kind);
}

function oneGroup(desk: Desk): boolean {
  const [first, ...others] = selectedParts(desk);
  const name = first && matchOf(first);
  return name !== undefined && others.every((part) => part.kind === first?.kind && matchOf(part) === name);
}

function keepEqual(desk: Desk): void {
  const parts = selectedParts(desk);
  const group = parts.map(matchOf).find((name) => name !== undefined);
  const matched = desk.commands.matchParts(desk.selection.parts, group);
  if (matched) desk.say(`Kept equal as ${matched.name}: ${parts.length} parts have the values of ${matched.model}.`);
}

function letApart(desk: Desk): void {
  desk.commands.unmatchParts(desk.selection.parts);
  const { size } = desk.selection.parts;
  desk.say(`${size === 1 ? 'This part is' : `These ${size} parts are`} no longer kept equal; the values stay.`);
}

function renumber(desk: Desk, order: 'columns' | 'rows'): void {
  const chosen = desk.selection.parts.size > 1 ? desk.selection.parts : undefined;
  const changed = desk.commands.renumber(order, chosen);
  const which = chosen ? 'selected parts' : 'parts';
  const way = order === 'columns' ? 'column by column' : 'row by row';
  if (changed === 0) desk.say(`The ${which} are numbered ${way} already.`);
  else desk.say(`Renumbered ${way}: ${changed} ${changed === 1 ? 'reference' : 'references'} changed.`);
}

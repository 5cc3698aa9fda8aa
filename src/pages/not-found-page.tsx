import { DeadEnd } from '../ui/dead-end';

export function NotFoundPage() {
  return (
    <DeadEnd title="There is nothing here">
      <p>No page has this address. It may be mistyped, or the sheet may belong to a team that you are not in.</p>
    </DeadEnd>
  );
}

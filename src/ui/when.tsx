import { formatWhen, formatWhenInFull } from '../formats/when';

/** A moment in the reader's own time; the whole date on hover. */
export function When({ at }: { readonly at: string }) {
  return (
    <time dateTime={at} title={formatWhenInFull(at)} className="whitespace-nowrap">
      {formatWhen(at, new Date())}
    </time>
  );
}

import { aboutOf, BEGINNINGS, type Beginning, keyOf, nameOf } from './beginning';

/** The ways to begin a sheet, each with a line on what it brings. */
export function BeginSheet({ onChoose }: { readonly onChoose: (beginning: Beginning) => void }) {
  return (
    <section>
      <h2 className="text-xs text-faint">Begin a sheet</h2>
      <ul className="mt-2 border-b border-rule">
        {BEGINNINGS.map((beginning) => (
          <li key={keyOf(beginning)} className="border-t border-rule">
            <button
              type="button"
              className="group flex w-full flex-col items-start py-2.5 text-left"
              onClick={() => onChoose(beginning)}
            >
              <span className="font-bold underline decoration-edge underline-offset-4 group-hover:decoration-current">
                {nameOf(beginning)}
              </span>
              <span className="mt-1 text-xs text-faint">{aboutOf(beginning)}</span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
}

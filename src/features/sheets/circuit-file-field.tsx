import { useId } from 'react';
import { type CircuitFile, readCircuitFile } from './read-circuit-file';

const SHOWN = 6;

interface CircuitFileFieldProps {
  readonly read: CircuitFile | null;
  readonly missing: boolean;
  readonly onRead: (read: CircuitFile) => void;
}

/** Takes a circuit file and says at once all that is wrong with it. */
export function CircuitFileField({ read, missing, onRead }: CircuitFileFieldProps) {
  const id = useId();
  const faulty = missing || read?.ok === false;
  return (
    <div>
      <label htmlFor={id} className="mb-1 block text-xs text-faint">
        Circuit file
      </label>
      <input
        id={id}
        type="file"
        accept=".json,application/json"
        aria-invalid={faulty}
        aria-describedby={`${id}-said`}
        className="w-full border border-edge bg-sheet text-xs file:mr-3 file:min-h-9 file:border-0 file:border-r file:border-solid file:border-edge file:bg-paper file:px-3 aria-invalid:border-missed"
        onChange={async (event) => {
          const file = event.target.files?.[0];
          if (file !== undefined) onRead(await readCircuitFile(file));
        }}
      />
      <div id={`${id}-said`} role="status" className="mt-1 text-xs break-words">
        {missing && <p className="text-missed">Choose a file, or begin from something else.</p>}
        {read?.ok === true && <p className="text-faint">Read; nothing is wrong with it.</p>}
        {read?.ok === false && <Problems message={read.message} problems={read.problems} />}
      </div>
    </div>
  );
}

function Problems({ message, problems }: { readonly message: string; readonly problems: readonly string[] }) {
  return (
    <div className="text-missed">
      <p>{message}</p>
      <ul className="mt-2 flex list-[square] flex-col gap-1 pl-4">
        {problems.slice(0, SHOWN).map((problem) => (
          <li key={problem}>{problem}</li>
        ))}
      </ul>
      {problems.length > SHOWN && <p className="mt-1">And {problems.length - SHOWN} more.</p>}
    </div>
  );
}

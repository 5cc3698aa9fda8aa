import { X } from 'lucide-react';
import { createContext, type ReactNode, useCallback, useContext, useMemo, useRef, useState } from 'react';

interface Message {
  readonly id: number;
  readonly text: string;
}

interface Status {
  /** Says what happened, when the listener has a moment; the message goes by itself. */
  readonly say: (text: string) => void;
  /** Says what went wrong and what to do, at once; the message stays until it is dismissed. */
  readonly warn: (text: string) => void;
}

const StatusContext = createContext<Status | null>(null);

export function useStatus(): Status {
  const status = useContext(StatusContext);
  if (status === null) throw new Error('useStatus is called outside StatusProvider');
  return status;
}

const SHOWN_FOR_MS = 6000;

/** Messages about what was done, shown at the foot of the window and read out, without taking the focus. */
export function StatusProvider({ children }: { readonly children: ReactNode }) {
  const [said, setSaid] = useState<readonly Message[]>([]);
  const [warned, setWarned] = useState<readonly Message[]>([]);
  const nextId = useRef(0);

  const say = useCallback((text: string) => {
    nextId.current += 1;
    const message = { id: nextId.current, text };
    // Only the latest: older ones would cover the page they are about.
    setSaid([message]);
    setTimeout(() => setSaid((before) => before.filter((one) => one !== message)), SHOWN_FOR_MS);
  }, []);
  const warn = useCallback((text: string) => {
    nextId.current += 1;
    const message = { id: nextId.current, text };
    setWarned((before) => [...before.filter((one) => one.text !== text).slice(-2), message]);
  }, []);
  const status = useMemo(() => ({ say, warn }), [say, warn]);

  return (
    <StatusContext value={status}>
      {children}
      {/* Both regions stay in the page: a region added together with its text is not read out. */}
      <div className="pointer-events-none fixed inset-x-0 bottom-0 z-60 flex flex-col items-start gap-2 p-4">
        <div role="status" className="flex flex-col items-start gap-2">
          {said.map((message) => (
            <p key={message.id} className="max-w-120 border border-ink bg-ink px-3.5 py-2 break-words text-sheet">
              {message.text}
            </p>
          ))}
        </div>
        <div role="alert" className="flex flex-col items-start gap-2">
          {warned.map((message) => (
            <div
              key={message.id}
              className="pointer-events-auto flex max-w-120 items-start gap-3 border border-missed bg-sheet py-2 pr-1.5 pl-3.5 text-missed"
            >
              <p className="min-w-0 break-words">{message.text}</p>
              <button
                type="button"
                aria-label="Dismiss this message"
                className="flex size-6 shrink-0 items-center justify-center"
                onClick={() => setWarned((before) => before.filter((one) => one !== message))}
              >
                <X size={16} strokeWidth={1.5} aria-hidden />
              </button>
            </div>
          ))}
        </div>
      </div>
    </StatusContext>
  );
}

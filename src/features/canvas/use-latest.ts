import { type RefObject, useLayoutEffect, useRef } from 'react';

/** The latest value for handlers that must stay the same function from render to render. */
export function useLatest<T>(value: T): RefObject<T> {
  const latest = useRef(value);
  useLayoutEffect(() => {
    latest.current = value;
  });
  return latest;
}

import { useState } from 'react';
import { useStoreApi } from 'reactflow';

/** React's StrictMode makes React Flow v11 believe, in development, that its constants are made anew (warning 002). */
export function useQuietStrictMode() {
  const store = useStoreApi();
  useState(() =>
    store.setState({
      onError: (code, message) => {
        if (code !== '002') console.warn(message);
      },
    }),
  );
}

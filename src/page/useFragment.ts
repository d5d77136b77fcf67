import { useSyncExternalStore } from 'react';

const subscribe = (listener: () => void): (() => void) => {
  addEventListener('hashchange', listener);
  return () => removeEventListener('hashchange', listener);
};

/** The address's fragment, without its mark. */
export const useFragment = (): string => useSyncExternalStore(subscribe, () => location.hash.slice(1));

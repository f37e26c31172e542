import { useSyncExternalStore } from 'react'

const neverChanges = () => () => {}

/** False on the server and until scripts have taken over the page. */
export function useHydrated(): boolean {
  return useSyncExternalStore(
    neverChanges,
    () => true,
    () => false,
  )
}

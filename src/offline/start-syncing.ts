export function startSyncing(): () => void {
  return () => undefined;
}
export async function syncNow(): Promise<void> {}
export function requestSync(): void {}

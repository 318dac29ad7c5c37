/** Whether this account has read the cautions on this phone; where it cannot be kept, they are shown again. */
const keyOf = (accountId: string) => `sumpless-cautions-read-${accountId}`;

export function cautionsRead(accountId: string): boolean {
  try {
    return localStorage.getItem(keyOf(accountId)) !== null;
  } catch {
    return false;
  }
}

export function rememberCautionsRead(accountId: string): void {
  try {
    localStorage.setItem(keyOf(accountId), new Date().toISOString());
  } catch {
    // Shown again before the next check.
  }
}

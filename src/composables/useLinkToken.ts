/**
 * The token of a link that was mailed. It stands behind the #, which no server sees; taken out of the address at once,
 * so that it is neither sent on nor left in the history.
 */
export function useLinkToken(): string | null {
  const token = location.hash.slice(1);
  if (token) history.replaceState(history.state, '', location.pathname);
  return token || null;
}

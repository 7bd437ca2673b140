/**
 * Goes to a page of this site by a whole new request, when who is signed in has changed: nothing of before stays in the window or in the
 * router's cache. To the page in view itself a browser would only scroll, so that is fetched anew.
 */
export function leaveFor(address: string): void {
  const to = new URL(address, window.location.origin);
  if (to.pathname === window.location.pathname && to.search === window.location.search) window.location.reload();
  else window.location.assign(to);
}

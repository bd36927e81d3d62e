const PATIENCE_MS = 4000;
let stopWaiting = (): void => undefined;

/**
 * Moves the focus to the page's main heading once it is there, so that the keyboard and a screen reader start at the
 * new page. Gives up when the reader has gone on to something else meanwhile.
 */
export function focusHeading(): void {
  stopWaiting();
  const before = document.activeElement;
  if (takeFocus()) return;

  const observer = new MutationObserver(() => {
    if (document.activeElement !== before && document.activeElement !== document.body) stopWaiting();
    else if (takeFocus()) stopWaiting();
  });
  const timer = setTimeout(() => stopWaiting(), PATIENCE_MS);
  stopWaiting = () => {
    observer.disconnect();
    clearTimeout(timer);
  };
  observer.observe(document.body, { childList: true, subtree: true });
}

function takeFocus(): boolean {
  const heading = document.querySelector<HTMLElement>('main h1');
  if (!heading) return false;
  heading.tabIndex = -1;
  heading.focus({ preventScroll: true });
  return true;
}

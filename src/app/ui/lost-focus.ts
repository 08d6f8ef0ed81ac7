import { DOCUMENT, type Injector, afterNextRender } from '@angular/core';

/**
 * Keeps somebody at the keyboard in place: once the page is drawn anew, and only where what had the focus has left the
 * page, the focus goes to `heir`.
 */
export function catchLostFocus(
  injector: Injector,
  heir: () => HTMLElement | null | undefined,
): void {
  const document = injector.get(DOCUMENT);
  afterNextRender(
    () => {
      if (document.activeElement === document.body) heir()?.focus();
    },
    { injector },
  );
}

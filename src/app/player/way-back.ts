import type { Router } from '@angular/router';

/** The page the viewer came from, if it is one to go back to; otherwise the scenes. Call while the player is being opened. */
export function wayBack(router: Router): string {
  const before = router.currentNavigation()?.previousNavigation?.finalUrl?.toString() ?? '';
  return /^\/(compose|scenes|photos)(\/|\?|$)/.test(before) ? before : '/scenes';
}

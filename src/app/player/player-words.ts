import type { TrackingState } from '../tracking/tracking-state';

/** What the line at the foot of the picture can offer. */
export type PlayerOffer = 'try-again' | 'go-without' | 'follow' | 'set-up' | 'as-it-is' | 'reload';

/** One line of plain words, and what it offers. */
export interface PlayerLine {
  /** What it speaks of: a line that fades is shown once for each. */
  readonly about: string;
  readonly words: string;
  readonly offers: readonly PlayerOffer[];
  /** Whether it goes away by itself when it has been read. */
  readonly fades: boolean;
}

export interface PlayerSituation {
  /** Whether this screen was set up, or someone chose to go without. */
  readonly screenDecided: boolean;
  /** Names of layers whose picture did not come. */
  readonly missing: readonly string[];
  readonly following: boolean;
  readonly tracking: TrackingState;
  /** Whether the ladder has given up looking, because this computer cannot keep up. */
  readonly tooSlow: boolean;
  /** Whether less motion is asked for. */
  readonly still: boolean;
  /** Whether it was already said that the camera's pictures stay here. */
  readonly privacyTold: boolean;
  readonly byHand: boolean;
  readonly userAgent: string;
}

const privacy = 'The camera’s pictures stay in this page and are not kept.';
const stays = (about: string, words: string, offers: readonly PlayerOffer[] = []): PlayerLine => ({ about, words, offers, fades: false });
const fades = (about: string, words: string, offers: readonly PlayerOffer[] = []): PlayerLine => ({ about, words, offers, fades: true });

/** What to say, if anything; the first that applies. */
export function playerLine(now: PlayerSituation): PlayerLine | null {
  if (now.missing.length > 0) return stays('missing', missingWords(now.missing), ['reload']);
  if (!now.screenDecided)
    return stays('screen', 'This screen has not been measured. Measured, the picture keeps its true depths; until then 96 px count as an inch.', ['set-up', 'as-it-is']);
  if (!now.following)
    return now.still
      ? fades('by-hand', 'Your system asks for less motion, so nothing moves by itself. Look around with the arrow keys, + and −, or by dragging.', ['follow'])
      : fades('by-hand', 'Look around with the pointer, the arrow keys, + and −.', ['follow']);
  return trackingLine(now);
}

function trackingLine(now: PlayerSituation): PlayerLine | null {
  if (now.tooSlow && (now.tracking === 'nobody' || now.tracking === 'following'))
    return stays('too-slow', 'This computer is too busy to follow you just now. It tries again by itself; pointer and arrow keys still work.');
  const telling = (words: string) => (now.privacyTold ? words : `${words} ${privacy}`);
  switch (now.tracking) {
    case 'off':
      return null;
    case 'asking':
      return stays(now.tracking, telling('Oriel asks for the camera, so that the picture can follow your face.'), ['go-without']);
    case 'starting':
      return stays(now.tracking, telling('Getting ready to follow you.'));
    case 'refused':
      return stays(now.tracking, `The camera was refused. ${howToAllow(now.userAgent)}`, ['try-again', 'go-without']);
    case 'no-camera':
      return stays(now.tracking, 'No camera was found. Connect one, and it is used at once.', ['try-again', 'go-without']);
    case 'camera-busy':
      return stays(now.tracking, 'The camera is in use elsewhere. Close what uses it, and it is taken up within seconds.', ['try-again', 'go-without']);
    case 'unsupported':
      return stays(now.tracking, 'This page cannot have a camera: the address must begin with https, or be on this computer. Pointer and arrow keys still work.', ['go-without']);
    case 'failed':
      return stays(now.tracking, 'Following stopped unexpectedly. It starts again by itself; pointer and arrow keys still work.', ['try-again', 'go-without']);
    case 'nobody':
      return now.byHand ? null : fades(now.tracking, telling(now.still ? 'Nobody is in view of the camera.' : 'Nobody is in view of the camera. The picture drifts until someone comes.'));
    case 'following':
      return now.byHand ? null : fades(now.tracking, telling('Following you.'));
  }
}

function missingWords(missing: readonly string[]): string {
  return missing.length === 1
    ? `The picture of the layer ${missing[0]} could not be loaded.`
    : `The pictures of ${missing.length} layers could not be loaded: ${missing.join(', ')}.`;
}

/** What the switch that has a face followed says; `long` may be left unseen where there is little room. */
export interface FollowingWords {
  readonly long: string;
  readonly short: string;
  /** Whether a camera is at work, or to be. */
  readonly camera: boolean;
}

/** Whether a face is to be followed, and, where it is and cannot be, why not. */
export function followingWords(wanted: boolean, state: TrackingState): FollowingWords {
  if (!wanted) return { long: 'Following', short: 'off', camera: false };
  switch (state) {
    case 'refused':
      return { long: 'Following:', short: 'camera refused', camera: false };
    case 'no-camera':
    case 'unsupported':
      return { long: 'Following:', short: 'no camera', camera: false };
    case 'camera-busy':
      return { long: 'Following:', short: 'camera busy', camera: false };
    case 'failed':
      return { long: 'Following:', short: 'stopped', camera: false };
    default:
      return { long: 'Following', short: 'on', camera: true };
  }
}

/** How is looked, in the ladder's words, while there is looking at all. */
export const lookingWords = (state: TrackingState, ladder: string): string =>
  state === 'nobody' || state === 'following' ? ladder : 'nothing: no camera on';

/** Where this browser keeps its permission for the camera. */
export function howToAllow(userAgent: string): string {
  if (/Firefox\//.test(userAgent)) return 'To allow it, click the crossed-out camera left of the address, then try again.';
  if (/Edg\/|Chrome\/|Chromium\//.test(userAgent)) return 'To allow it, click the sign left of the address, switch the camera on, then try again.';
  if (/iPhone|iPad/.test(userAgent)) return 'To allow it, tap the sign beside the address, choose Website settings, allow the camera, then try again.';
  if (/Safari\//.test(userAgent)) return 'To allow it, choose Settings for this website in the Safari menu, allow the camera, then try again.';
  return 'To allow it, change this page’s permissions in the browser, then try again.';
}

/** The words on each offer's button. */
export const offerWords: Readonly<Record<PlayerOffer, string>> = {
  'try-again': 'Try again',
  'go-without': 'Go on without',
  follow: 'Follow my face',
  'set-up': 'Set up this screen',
  'as-it-is': 'Play as it is',
  reload: 'Try again',
};

import type { TrackingState } from '../tracking/tracking-state';
import { type PlayerSituation, followingWords, howToAllow, lookingWords, playerLine } from './player-words';

const usual: PlayerSituation = {
  screenDecided: true, missing: [], following: true, tracking: 'following', tooSlow: false, still: false, privacyTold: false, byHand: false,
  userAgent: 'Mozilla/5.0 (X11; Linux x86_64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/140.0.0.0 Safari/537.36',
};
const lineFor = (part: Partial<PlayerSituation>) => playerLine({ ...usual, ...part });
const privacy = /stay in this page and are not kept/;

describe('playerLine', () => {
  it('says that camera pictures stay here when the camera is asked for, and when following begins, until it was told', () => {
    for (const tracking of ['asking', 'starting', 'following', 'nobody'] as const) expect(lineFor({ tracking })?.words).toMatch(privacy);
    expect(lineFor({ privacyTold: true })?.words).not.toMatch(privacy);
  });

  it('says that the computer is too busy, and not that nobody is there, where it has given up looking', () => {
    expect(lineFor({ tracking: 'nobody', tooSlow: true })).toMatchObject({ about: 'too-slow', fades: false });
    expect(lineFor({ tracking: 'no-camera', tooSlow: true })?.about).toBe('no-camera');
  });

  it.each(['refused', 'no-camera', 'camera-busy', 'unsupported', 'failed'] as const)('stays and offers to go on without when %s', (tracking) => {
    expect(lineFor({ tracking })).toMatchObject({ fades: false, offers: expect.arrayContaining(['go-without']) as unknown });
  });

  it('has words of its own for every state but off', () => {
    const states: TrackingState[] = ['asking', 'refused', 'no-camera', 'camera-busy', 'unsupported', 'starting', 'nobody', 'following', 'failed'];
    expect(new Set(states.map((tracking) => lineFor({ tracking })?.words)).size).toBe(states.length);
    expect(lineFor({ tracking: 'off' })).toBeNull();
  });

  it('lets the line go where nothing is asked', () => {
    expect(lineFor({})?.fades).toBe(true);
    expect(lineFor({ tracking: 'nobody' })?.fades).toBe(true);
    expect(lineFor({ tracking: 'nobody', byHand: true })).toBeNull();
  });

  it('offers the set-up first, and speaks of missing layers before anything else', () => {
    expect(lineFor({ screenDecided: false })?.offers).toEqual(['set-up', 'as-it-is']);
    expect(lineFor({ screenDecided: false, missing: ['Sky', 'Ridge'] })?.words).toContain('Sky, Ridge');
  });

  it('says that less motion is honoured, and promises no drift', () => {
    expect(lineFor({ following: false, still: true })).toMatchObject({ offers: ['follow'], words: expect.stringContaining('less motion') as unknown });
    expect(lineFor({ tracking: 'nobody', still: true })?.words).not.toContain('drift');
  });
});

describe('what the switch and the figures say of following', () => {
  it('is on while a face is looked for, and off where that is chosen', () => {
    for (const state of ['asking', 'starting', 'nobody', 'following'] as const) expect(followingWords(true, state)).toMatchObject({ short: 'on', camera: true });
    for (const state of ['off', 'following', 'refused'] as const) expect(followingWords(false, state)).toMatchObject({ short: 'off', camera: false });
  });

  it.each([
    ['refused', 'camera refused'],
    ['no-camera', 'no camera'],
    ['unsupported', 'no camera'],
    ['camera-busy', 'camera busy'],
    ['failed', 'stopped'],
  ] as const)('is not said to be on when %s', (state, short) => expect(followingWords(true, state)).toMatchObject({ short, camera: false }));

  it('claims no looking without a camera', () => {
    expect(lookingWords('following', 'zoomed detector')).toBe('zoomed detector');
    expect(lookingWords('refused', 'zoomed detector')).toBe('nothing: no camera on');
  });
});

describe('howToAllow', () => {
  it.each([
    [usual.userAgent, /left of the address/],
    ['Mozilla/5.0 (X11; Linux x86_64; rv:130.0) Gecko/20100101 Firefox/130.0', /crossed-out camera/],
    ['Mozilla/5.0 (Macintosh; Intel Mac OS X 10_15_7) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/17.4 Safari/605.1.15', /Safari menu/],
    ['Mozilla/5.0 (iPad; CPU OS 17_4 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/17.4 Mobile/15E148 Safari/604.1', /tap the sign/],
    ['something else', /permissions in the browser/],
  ])('knows where %s keeps it', (userAgent, words) => expect(howToAllow(userAgent)).toMatch(words));
});

import type { Page } from '@playwright/test';

type Unpluggable = Window & { unplug(): void };

/**
 * To be put into a wall's pages before they load: whatever camera tracks a page is given can then be ended from outside, and the page sees
 * what it sees when a camera is unplugged (W3C Media Capture and Streams, 4.3.1: the track has ended, and the event says so).
 */
export function plugged(): void {
  // An empty page has no cameras.
  if (!window.isSecureContext) return;
  const ask = navigator.mediaDevices.getUserMedia.bind(navigator.mediaDevices);
  const tracks: MediaStreamTrack[] = [];
  navigator.mediaDevices.getUserMedia = async (wanted) => {
    const stream = await ask(wanted);
    tracks.push(...stream.getVideoTracks());
    return stream;
  };
  (window as unknown as Unpluggable).unplug = () => {
    for (const track of tracks.splice(0)) {
      track.stop();
      track.dispatchEvent(new Event('ended'));
    }
  };
}

export const unplug = (page: Page): Promise<void> => page.evaluate(() => (window as unknown as Unpluggable).unplug());

import type { FromReplay, ReplayAsked } from './replay-messages';
import { searchBoth, tryBoth } from './search-both';

const say = (message: FromReplay): void => postMessage(message);

addEventListener('message', ({ data }: MessageEvent<ReplayAsked>) => {
  try {
    if (data.what === 'search') searchBoth(data, say);
    else say({ type: 'today', tried: tryBoth(data) });
  } catch {
    say({ type: 'failed' });
  }
});

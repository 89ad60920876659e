import type { FromReplay, SearchAsked } from './replay-messages';
import { searchBoth } from './search-both';

const say = (message: FromReplay): void => postMessage(message);

addEventListener('message', ({ data }: MessageEvent<SearchAsked>) => {
  try {
    searchBoth(data, say);
  } catch {
    say({ type: 'failed' });
  }
});

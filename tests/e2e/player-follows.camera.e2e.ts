import { expectFollowed, watchRests } from './player/follow-checks';
import { restingFace } from './player/rest-poses';
import { test } from './fixtures';

test.use({ filmedFace: restingFace, viewport: { width: 1280, height: 720 } });

test('drawn with CSS, layers stand where the pinhole model puts them for the true eye, wherever it rests', async ({ signedInPage, filmed }) => {
  test.setTimeout(180_000);
  const page = await signedInPage('designer');
  await expectFollowed(await watchRests(page, 'css'), filmed!.truth);
});

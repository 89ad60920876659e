import { expectFollowed, watchRests } from './player/follow-checks';
import { restingFace } from './player/rest-poses';
import { test } from './fixtures';

test.use({ filmedFace: restingFace, graphics: 'swiftshader', viewport: { width: 480, height: 270 } });

test('drawn with three, layers stand where the pinhole model puts them for the true eye, wherever it rests', async ({ signedInPage, filmed }) => {
  test.setTimeout(240_000);
  const page = await signedInPage('designer');
  await expectFollowed(await watchRests(page, 'three'), filmed!.truth);
});

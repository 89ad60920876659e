import { expectFollowed, watchRests } from './player/follow-checks';
import { window as viewport } from './player/follow-scene';
import { restingFace } from './player/rest-poses';
import { test } from './fixtures';

test.use({ filmedFace: restingFace, graphics: 'swiftshader', viewport });

test('drawn with three, layers stand where the pinhole model puts them for the true eye, wherever it rests', async ({ signedInPage, filmed }) => {
  test.setTimeout(420_000);
  const page = await signedInPage('designer');
  await expectFollowed(await watchRests(page, 'three'), filmed!.truth);
});

import { DomainFailure } from '../http/failure';

export const sceneNotHere = () =>
  new DomainFailure(
    422,
    'scene-not-here',
    'The scene chosen is not in this household, or is in its bin.',
    'Choose another scene, or take this one out of the bin.',
    {
      fields: { 'setUp.sceneId': 'This scene is not here' },
    },
  );

export const codeUnknown = () =>
  new DomainFailure(
    422,
    'code-unknown',
    'No screen shows this code.',
    'Compare it with the screen: after ten minutes a screen shows another.',
    {
      fields: { code: 'No screen shows this code' },
    },
  );

/*
 * Finds the board in pictures and measures the camera from several of them, with OpenCV.js. OpenCV.js makes functions from text, so this
 * is a classic worker whose own reply allows that; the page stays strict. Messages are those of board-messages.ts.
 */
/* global cv, importScripts */
importScripts('opencv.js');

const ready = new Promise((resolve) => {
  if (cv.Mat) resolve();
  else cv.onRuntimeInitialized = () => resolve();
});

let detector = null;

function detectorFor({ columns, rows, squareMm, markerMm }) {
  if (detector) return detector;
  const dictionary = cv.getPredefinedDictionary(cv.DICT_4X4_50);
  const board = new cv.aruco_CharucoBoard(new cv.Size(columns, rows), squareMm, markerMm, dictionary, new cv.Mat());
  detector = new cv.aruco_CharucoDetector(
    board,
    new cv.aruco_CharucoParameters(),
    new cv.aruco_DetectorParameters(),
    new cv.aruco_RefineParameters(10, 3, true),
  );
  return detector;
}

/** The board's inner corners in one grey picture. */
function look({ board, width, height, grey }) {
  const picture = new cv.Mat(height, width, cv.CV_8UC1);
  picture.data.set(grey);
  const corners = new cv.Mat();
  const ids = new cv.Mat();
  const markers = new cv.MatVector();
  const markerIds = new cv.Mat();
  detectorFor(board).detectBoard(picture, corners, ids, markers, markerIds);
  const seen = { ids: Array.from(ids.data32S ?? []), corners: Array.from(corners.data32F ?? []) };
  for (const made of [picture, corners, ids, markers, markerIds]) made.delete();
  return seen;
}

/** The camera that shows all those corners best: square pixels, radial distortion of two terms, the middle of the picture free. */
function calibrate({ board, width, height, views }) {
  const objects = new cv.MatVector();
  const images = new cv.MatVector();
  const across = board.columns - 1;
  for (const { ids, corners } of views) {
    const places = ids.flatMap((id) => [((id % across) + 1) * board.squareMm, (Math.floor(id / across) + 1) * board.squareMm, 0]);
    objects.push_back(cv.matFromArray(ids.length, 1, cv.CV_32FC3, places));
    images.push_back(cv.matFromArray(ids.length, 1, cv.CV_32FC2, corners));
  }
  const camera = cv.matFromArray(3, 3, cv.CV_64F, [width, 0, width / 2, 0, width, height / 2, 0, 0, 1]);
  const made = Array.from({ length: 6 }, () => new cv.Mat());
  const [distortion, spreads, placeSpreads, errors] = made;
  const turns = new cv.MatVector();
  const places = new cv.MatVector();
  const rmsPx = cv.calibrateCameraExtended(
    objects,
    images,
    new cv.Size(width, height),
    camera,
    distortion,
    turns,
    places,
    spreads,
    placeSpreads,
    errors,
    cv.CALIB_USE_INTRINSIC_GUESS | cv.CALIB_FIX_ASPECT_RATIO | cv.CALIB_ZERO_TANGENT_DIST | cv.CALIB_FIX_K3,
    new cv.TermCriteria(cv.TermCriteria_COUNT + cv.TermCriteria_EPS, 100, 1e-9),
  );
  const [fx, , cx, , fy, cy] = camera.data64F;
  const lens = {
    rmsPx,
    focalPx: (fx + fy) / 2,
    // With square pixels only one of the two is free, and has a spread.
    focalSpreadPx: Math.max(spreads.data64F[0], spreads.data64F[1]),
    centre: { x: cx, y: cy },
    centreSpread: { x: spreads.data64F[2], y: spreads.data64F[3] },
    radial: [distortion.data64F[0], distortion.data64F[1]],
  };
  for (const one of [objects, images, camera, turns, places, ...made]) one.delete();
  return lens;
}

const reasonOf = (cause) => (typeof cause === 'number' ? cv.exceptionFromPtr(cause).msg : String(cause?.message ?? cause));

self.onmessage = async ({ data }) => {
  await ready;
  try {
    if (data.type === 'look') self.postMessage({ type: 'seen', ...look(data) });
    if (data.type === 'calibrate') self.postMessage({ type: 'lens', ...calibrate(data) });
  } catch (cause) {
    self.postMessage({ type: 'failed', reason: reasonOf(cause) });
  }
};

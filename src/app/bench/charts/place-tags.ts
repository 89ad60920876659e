/** A point, and how large the words beside it are; px. */
export interface TagAt {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

export interface Area {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

/** Between a point's middle and its words. */
const AWAY_PX = 11;

/**
 * Where the words of each point go: to its right, left, above or below, or farther above and below, the first place within the area that
 * touches neither another point nor words placed before; to its right where there is none.
 */
export function placeTags(tags: readonly TagAt[], area: Area): Area[] {
  const placed: Area[] = [];
  const marks = tags.map(({ x, y }) => ({ left: x - 6, right: x + 6, top: y - 6, bottom: y + 6 }));
  for (const tag of tags) {
    const free = placesOf(tag).find((place) => isWithin(place, area) && ![...placed, ...marks].some((other) => touch(place, other)));
    placed.push(free ?? placesOf(tag)[0]);
  }
  return placed;
}

function placesOf({ x, y, width, height }: TagAt): Area[] {
  const at = (left: number, top: number): Area => ({ left, right: left + width, top, bottom: top + height });
  const middle = x - width / 2;
  return [
    at(x + AWAY_PX, y - height / 2),
    at(x - AWAY_PX - width, y - height / 2),
    at(middle, y - AWAY_PX - height),
    at(middle, y + AWAY_PX),
    at(x + AWAY_PX, y - AWAY_PX - height),
    at(x + AWAY_PX, y + AWAY_PX),
    at(middle, y - AWAY_PX - 2.2 * height),
    at(middle, y + AWAY_PX + 1.2 * height),
  ];
}

const isWithin = (place: Area, area: Area) =>
  place.left >= area.left && place.right <= area.right && place.top >= area.top && place.bottom <= area.bottom;

const touch = (a: Area, b: Area) => a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;

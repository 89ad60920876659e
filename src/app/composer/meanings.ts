/** What the words of the trade on the sheet mean, for whoever meets them for the first time. */
export const meanings = {
  depth: 'How far a layer stands from the glass: + behind it, − in front of it, toward the viewer. From the home eye the picture stays the same whatever the depths.',
  bleed:
    'What a layer has to spare beyond the glass before its edge would show, at its scarcest: from the worst eye of the viewing zone. Below zero it is short, and its edge shows from there. A cut-out that ends inside the glass needs none.',
  clear: 'From nowhere in the viewing zone does the edge of a layer or an open side of the glass show. That is worked out from the figures for the whole zone, not tried here and there.',
  homeEye: 'The place from which the scene looks exactly like the flat photograph: right and up from the centre of the glass, and away from it.',
  zone: 'The places where eyes may be while they look: from the left end to the right, the lowest to the highest, the nearest to the farthest. Every layer needs bleed for all of them.',
  placed: 'Place and size as seen on the glass from the home eye. A layer behind the glass is larger in its own plane, one in front is smaller.',
} as const;

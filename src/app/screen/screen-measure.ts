import type { Glass } from '@oriel/shared/projection/types';

/** The card of ISO/IEC 7810, format ID-1 (bank and identity cards), mm. */
export const card = { widthMm: 85.6, heightMm: 53.98 } as const;

export const mmPerInch = 25.4;
/** What a CSS px is by definition, 1/96 inch; browsers keep to it only roughly. Good until the screen is measured. */
export const nominalPxMm = mmPerInch / 96;

/** The size of one px, mm, from the px over which a card's long side lies. */
export function pxMmFromCard(cardWidthPx: number): number {
  return card.widthMm / cardWidthPx;
}

/** The size of a glass of so many px, mm, from the length of its diagonal; its px are taken to be square. */
export function glassFromDiagonal(diagonalMm: number, widthPx: number, heightPx: number): Glass {
  const pxMm = diagonalMm / Math.hypot(widthPx, heightPx);
  return { widthMm: widthPx * pxMm, heightMm: heightPx * pxMm };
}

/** Diagonal of a glass, mm. */
export function diagonalOf(glass: Glass): number {
  return Math.hypot(glass.widthMm, glass.heightMm);
}

export const radians = (degrees: number) => (degrees * Math.PI) / 180;
export const degrees = (rad: number) => (rad * 180) / Math.PI;

import { type DerivativeEdge, derivativeEdges } from '@oriel/shared/contracts/photos';
import { type LayerImage, layerImageFile } from '@oriel/shared/contracts/scenes';
import { addressOf } from '../../core/api';

/** Where the picture of a layer is fetched, its long edge at most `edge` px. */
export const imageAddress = (image: LayerImage, edge: DerivativeEdge): string => addressOf(layerImageFile, { imageId: image.id, edge });

/** The smallest derivative that is sharp when its long edge is drawn `px` screen pixels long. */
export const edgeFor = (px: number): DerivativeEdge => derivativeEdges.find((edge) => edge >= px) ?? derivativeEdges[derivativeEdges.length - 1];

import type { Request, Response } from 'express';
import type { DerivativeEdge } from '@oriel/shared/contracts/photos';
import type { Parts } from '../parts';
import { edgeKept, layerKey } from '../storage/keys';
import { sendStored } from '../storage/send-stored';
import type { LayerSource } from './layer-files';

/** Answers with a layer's picture, its long edge at most `asked` px; it is made when first asked for. */
export async function sendLayerImage(
  { storage, layerFiles }: Pick<Parts, 'storage' | 'layerFiles'>,
  request: Request,
  response: Response,
  image: LayerSource,
  asked: DerivativeEdge,
): Promise<void> {
  const edge = edgeKept(image.width, image.height, asked);
  await layerFiles.ensure(image, edge);
  await sendStored(storage, request, response, {
    key: layerKey(image.sha256, edge),
    mime: 'image/webp',
    tag: `${image.sha256}-layer-${edge}`,
  });
}

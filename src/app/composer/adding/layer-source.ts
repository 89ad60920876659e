import { Injectable, inject, signal } from '@angular/core';
import { type LayerImage, layerImageFromPhoto, uploadLayerImage } from '@oriel/shared/contracts/scenes';
import { Api } from '../../core/api';
import { type ApiFailure, toApiFailure } from '../../core/api-failure';
import { ownId } from '../../core/own-id';

export interface NewLayer {
  readonly name: string;
  readonly image: LayerImage;
}

/** A photo or file on its way to becoming a layer. */
export interface Waiting {
  readonly key: string;
  readonly name: string;
  readonly from: { readonly photoId: string } | { readonly file: File };
  readonly state: 'going' | 'here' | 'failed';
  readonly layer: NewLayer | null;
  readonly failure: ApiFailure | null;
}

/** Asks the server to make layer images, one after another so that their order is kept. */
@Injectable()
export class LayerSource {
  private readonly api = inject(Api);
  readonly waiting = signal<readonly Waiting[]>([]);

  photos(sceneId: string, photoIds: readonly string[]): Promise<void> {
    return this.bring(sceneId, photoIds.map((photoId) => going('Photo', { photoId })));
  }

  files(sceneId: string, files: readonly File[]): Promise<void> {
    return this.bring(sceneId, files.map((file) => going(file.name, { file })));
  }

  again(sceneId: string, one: Waiting): Promise<void> {
    this.change(one.key, { state: 'going', failure: null });
    return this.one(sceneId, one);
  }

  private async bring(sceneId: string, coming: readonly Waiting[]): Promise<void> {
    this.waiting.update((waiting) => [...waiting, ...coming]);
    for (const one of coming) await this.one(sceneId, one);
  }

  private async one(sceneId: string, { key, from }: Waiting): Promise<void> {
    try {
      const layer = await this.ask(sceneId, from);
      this.change(key, { state: 'here', layer, name: layer.name });
    } catch (error) {
      this.change(key, { state: 'failed', failure: toApiFailure(error) });
    }
  }

  private ask(sceneId: string, from: Waiting['from']): Promise<NewLayer> {
    if ('photoId' in from) return this.api.call(layerImageFromPhoto, { params: { sceneId }, body: { photoId: from.photoId } });
    const body = new FormData();
    body.set('file', from.file, from.file.name);
    return this.api.call(uploadLayerImage, { params: { sceneId }, body: body as unknown as Record<string, never> });
  }

  private change(key: string, to: Partial<Waiting>): void {
    this.waiting.update((waiting) => waiting.map((one) => (one.key === key ? { ...one, ...to } : one)));
  }
}

const going = (name: string, from: Waiting['from']): Waiting => ({
  key: ownId('layer'),
  name,
  from,
  state: 'going',
  layer: null,
  failure: null,
});

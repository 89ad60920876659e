import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import * as z from 'zod';
import { EyeSchema, GlassSchema, type Layer, PlacedSchema, type SceneDocument, ZoneSchema } from '@oriel/shared/contracts/scenes';

const Shipped = z.array(
  z.object({
    name: z.string(),
    credit: z.string().optional(),
    glass: GlassSchema,
    homeEye: EyeSchema,
    zone: ZoneSchema,
    layers: z.array(z.object({ name: z.string(), file: z.string(), depthMm: z.number(), placed: PlacedSchema, opacity: z.number(), shown: z.boolean() })),
  }),
);

export interface Welcome {
  readonly document: SceneDocument;
  readonly pictureOf: (layer: Layer) => string;
}

/** The first demo scene, from the files shipped with the page, for those who are not signed in. */
@Injectable({ providedIn: 'root' })
export class WelcomeScene {
  private readonly http = inject(HttpClient);

  async load(): Promise<Welcome | null> {
    const [first] = Shipped.parse(await firstValueFrom(this.http.get('/assets/demo/scenes.json')));
    const files = new Map(first.layers.map((layer, index) => [String(index), layer.file]));
    const layers = first.layers.map(({ name, depthMm, placed, opacity, shown }, index) => ({
      name,
      depthMm,
      placed,
      opacity,
      shown,
      id: String(index),
      image: { id: String(index), width: 1, height: 1, trim: { left: 0, top: 0, ofWidth: 1, ofHeight: 1 } },
    }));
    return {
      document: { ...first, layers },
      pictureOf: (layer) => `/assets/demo/${files.get(layer.id)}`,
    };
  }
}

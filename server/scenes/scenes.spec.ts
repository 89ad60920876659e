import { randomUUID } from 'node:crypto';
import { sql } from 'kysely';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Scene, type SceneDocument } from '@oriel/shared/contracts/scenes';
import { quadrants, quartersOf, uprightQuarters } from '../pictures/testing/quadrants';
import { upload } from '../pictures/testing/upload';
import { createTestApp, type SignedIn, type TestApp } from '../testing/test-app';
import { cutOut } from './testing/cut-out';

let app: TestApp;
let householdId: string;
let designer: SignedIn;
let other: SignedIn;
let elsewhere: { householdId: string; designer: SignedIn };

beforeAll(async () => {
  app = await createTestApp();
  householdId = (await app.household()).id;
  designer = await app.signedIn('designer', householdId);
  other = await app.signedIn('owner', householdId);
  const foreign = (await app.household('Next door')).id;
  elsewhere = { householdId: foreign, designer: await app.signedIn('designer', foreign) };
});
afterAll(() => app.close());

const uploadPhoto = async (file: Buffer, name: string, who = designer, household = householdId) =>
  (await upload(who.browser, `/api/households/${household}/photos`, file, name)).body.photo.id as string;
const create = async (body: object, who = designer, household = householdId) => {
  const answer = await who.browser.ask('post', `/api/households/${household}/scenes`, body);
  expect(answer.status, answer.text).toBe(200);
  return Scene.parse(answer.body.scene);
};
const save = (scene: Scene, document: SceneDocument, who = designer, revision = scene.revision) =>
  who.browser.ask('put', `/api/scenes/${scene.id}`, { revision, document });
const file = async (imageId: string, edge: number) => {
  const answer = await designer.browser.ask('get', `/api/images/${imageId}/${edge}`);
  expect(answer.status).toBe(200);
  expect(answer.headers['content-type']).toBe('image/webp');
  return answer.body as Buffer;
};

describe('a new scene', () => {
  it('is an empty lying sheet when made from nothing', async () => {
    const scene = await create({ name: ' The sheet ' });
    expect(scene.document).toMatchObject({
      name: 'The sheet',
      glass: { widthMm: 1210, heightMm: 681 },
      homeEye: { x: 0, y: 0, z: 1800 },
      layers: [],
    });
    expect(scene).toMatchObject({ revision: 1, savedBy: 'Test person', householdId });
  });

  it('made from one photo has it as the back layer in the glass, covering it', async () => {
    const photo = await uploadPhoto(await quadrants(900, 600).jpeg().toBuffer(), 'Picnic at the weir.jpg');
    const { document } = await create({ photoIds: [photo] });
    expect(document.name).toBe('Picnic at the weir');
    const [layer] = document.layers;
    expect(layer).toMatchObject({ name: 'Picnic at the weir', depthMm: 0, opacity: 1, shown: true });
    // 3:2 on 1210 x 681 (16:9): as wide as the glass, 1210 / 1.5 high.
    expect(layer.placed).toMatchObject({ xMm: 0, yMm: 0, widthMm: 1210 });
    expect(layer.placed.heightMm).toBeCloseTo(806.667, 3);
    expect(layer.image).toMatchObject({
      width: 900,
      height: 600,
      trim: { left: 0, top: 0, ofWidth: 900, ofHeight: 600 },
    });
  });

  it('stands when the photo stands, also when only its EXIF says so', async () => {
    const turned = await quadrants(600, 900).rotate(270).toBuffer({ resolveWithObject: true });
    const jpeg = await sharp(turned.data, { raw: turned.info }).jpeg().withMetadata({ orientation: 6 }).toBuffer();
    const { document } = await create({ photoIds: [await uploadPhoto(jpeg, 'tall.jpg')] });
    expect(document.glass).toEqual({ widthMm: 681, heightMm: 1210 });
    expect(await quartersOf(await file(document.layers[0].image.id, 320))).toEqual(uprightQuarters);
  });

  it('made from several keeps parts of one photograph in their places, the first farthest', async () => {
    const size = { width: 1000, height: 800 };
    const back = await uploadPhoto(await quadrants(1000, 800).png().toBuffer(), 'back.png');
    const left = await uploadPhoto(await cutOut(size, { left: 100, top: 500, width: 200, height: 300 }), 'left.png');
    const right = await uploadPhoto(await cutOut(size, { left: 700, top: 200, width: 250, height: 400 }), 'right.png');
    const { document } = await create({ name: 'Three', photoIds: [back, left, right] });
    expect(document.layers.map(({ name, depthMm }) => [name, depthMm])).toEqual([
      ['back', 1200],
      ['left', 600],
      ['right', 0],
    ]);
    expect(document.layers[1].image).toMatchObject({
      width: 200,
      height: 300,
      trim: { left: 100, top: 500, ofWidth: 1000, ofHeight: 800 },
    });

    // By hand: 1.21 mm a pixel. The left part's centre (200, 650) lies 300 px left of the middle and 250 below it.
    const [, leftPlaced, rightPlaced] = document.layers.map(({ placed }) => placed);
    expect(leftPlaced.xMm).toBeCloseTo(-363, 6);
    expect(leftPlaced.yMm).toBeCloseTo(-302.5, 6);
    expect(leftPlaced.widthMm).toBeCloseTo(242, 6);
    // Pixels between the two parts' left edges: 600.
    const edge = (placed: typeof leftPlaced) => placed.xMm - placed.widthMm / 2;
    expect((edge(rightPlaced) - edge(leftPlaced)) / 1.21).toBeCloseTo(600, 6);
  });

  it('says which photos are not there: binned, of another household, or none', async () => {
    const binned = await uploadPhoto(await quadrants(33, 44).png().toBuffer(), 'binned.png');
    await designer.browser.ask('post', `/api/households/${householdId}/photos/bin`, { photoIds: [binned] });
    const foreign = await uploadPhoto(
      await quadrants(44, 33).png().toBuffer(),
      'foreign.png',
      elsewhere.designer,
      elsewhere.householdId,
    );
    const none = randomUUID();
    const answer = await designer.browser.ask('post', `/api/households/${householdId}/scenes`, {
      photoIds: [binned, foreign, none],
    });
    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({ code: 'photo-not-here', detail: { photoIds: [binned, foreign, none] } });
  });
});

describe('images of layers', () => {
  it('keep their alpha, lose their surroundings and all metadata, at every size', async () => {
    const scene = await create({});
    const cut = await cutOut(
      { width: 2000, height: 1500 },
      { left: 300, top: 200, width: 1000, height: 500 },
      '#ff0000',
    );
    const answer = await upload(designer.browser, `/api/scenes/${scene.id}/images`, cut, 'Red barn.png');
    expect(answer.status, answer.text).toBe(200);
    expect(answer.body).toMatchObject({
      name: 'Red barn',
      image: { width: 1000, height: 500, trim: { left: 300, top: 200, ofWidth: 2000, ofHeight: 1500 } },
    });
    const sizes: number[][] = [];
    for (const edge of [320, 800, 1600, 3200]) {
      const metadata = await sharp(await file(answer.body.image.id, edge)).metadata();
      expect([metadata.exif, metadata.icc, metadata.xmp]).toEqual([undefined, undefined, undefined]);
      sizes.push([metadata.width, metadata.height]);
    }
    expect(sizes).toEqual([
      [320, 160],
      [800, 400],
      [1000, 500],
      [1000, 500],
    ]);
  });

  it('keep soft edges exactly', async () => {
    const ramp = Buffer.alloc(256 * 8 * 4);
    for (let i = 0; i < 256 * 8; i++) ramp.set([200, 100, 50, i % 256], i * 4);
    const scene = await create({});
    const png = await sharp(ramp, { raw: { width: 256, height: 8, channels: 4 } })
      .png()
      .toBuffer();
    const { image } = (await upload(designer.browser, `/api/scenes/${scene.id}/images`, png, 'ramp.png')).body;
    const alpha = await sharp(await file(image.id, 320))
      .extractChannel('alpha')
      .raw()
      .toBuffer();
    expect([...alpha.subarray(0, 252)]).toEqual(Array.from({ length: 252 }, (_, i) => i + 4));
  });

  it('are made once for many who ask at the same moment', async () => {
    const scene = await create({});
    const png = await quadrants(1200, 900).png().toBuffer();
    const { image } = (await upload(designer.browser, `/api/scenes/${scene.id}/images`, png, 'many.png')).body;
    const answers = await Promise.all(Array.from({ length: 12 }, (_, i) => file(image.id, i % 2 ? 320 : 1600)));
    expect(new Set(answers.map((body) => body.length)).size).toBe(2);
  });

  it('are the same image for the same content, from a file or a photo', async () => {
    const scene = await create({});
    const png = await quadrants(70, 50).png().toBuffer();
    const first = (await upload(designer.browser, `/api/scenes/${scene.id}/images`, png, 'a.png')).body;
    const photoId = await uploadPhoto(png, 'b.png');
    const second = (await designer.browser.ask('post', `/api/scenes/${scene.id}/images/from-photo`, { photoId })).body;
    expect(second.image).toEqual(first.image);
    expect(second.name).toBe('b');
  });

  it('refuses what is wholly transparent, and leaves nothing of it', async () => {
    const scene = await create({});
    const clear = await sharp({
      create: { width: 50, height: 50, channels: 4, background: { r: 9, g: 9, b: 9, alpha: 0 } },
    })
      .png()
      .toBuffer();
    const before = await app.db.selectFrom('layer_image').select('id').execute();
    const answer = await upload(designer.browser, `/api/scenes/${scene.id}/images`, clear, 'clear.png');
    expect(answer.status).toBe(422);
    expect(answer.body.code).toBe('nothing-opaque');
    expect(await app.db.selectFrom('layer_image').select('id').execute()).toHaveLength(before.length);
    const text = await upload(designer.browser, `/api/scenes/${scene.id}/images`, Buffer.from('words'), 'words.png');
    expect(text.body.code).toBe('not-a-picture');
  });
});

describe('saving', () => {
  it('writes the newest revision and says who saved it', async () => {
    const scene = await create({ name: 'First' });
    const answer = await save(scene, { ...scene.document, name: 'Second' }, other);
    expect(answer.status).toBe(200);
    expect(answer.body.scene).toMatchObject({ revision: 2, document: { name: 'Second' } });
    const read = await designer.browser.ask('get', `/api/scenes/${scene.id}`);
    expect(read.body.scene).toEqual(answer.body.scene);
  });

  it('never overwrites what another saved meanwhile, and says who and when', async () => {
    const scene = await create({ name: 'Shared' });
    const theirs = await save(scene, { ...scene.document, name: 'Theirs' }, other);
    const mine = await save(scene, { ...scene.document, name: 'Mine' });
    expect(mine.status).toBe(409);
    expect(mine.body).toMatchObject({
      code: 'revision-moved',
      detail: { revision: 2, savedBy: 'Test person', savedAt: theirs.body.scene.savedAt },
    });
    const read = await designer.browser.ask('get', `/api/scenes/${scene.id}`);
    expect(read.body.scene.document.name).toBe('Theirs');
    const copy = await designer.browser.ask('post', `/api/scenes/${scene.id}/duplicates`, {
      document: { ...scene.document, name: 'Mine' },
    });
    expect(copy.body.scene).toMatchObject({ revision: 1, document: { name: 'Mine copy' } });
  });

  it('says who saved meanwhile even to one who waited for that save', async () => {
    const scene = await create({ name: 'Waiting' });
    const waiting = sql<{ n: number }>`select count(*)::int as n from pg_stat_activity where datname = current_database() and wait_event_type = 'Lock'`;
    const { late } = await app.db.transaction().execute(async (transaction) => {
      await transaction.updateTable('scene').set({ revision: 2, saved_by: other.id }).where('id', '=', scene.id).execute();
      const late = save(scene, { ...scene.document, name: 'Late' });
      await expect.poll(async () => (await waiting.execute(app.db)).rows[0].n).toBe(1);
      return { late };
    });
    const refused = await late;
    expect(refused.status).toBe(409);
    expect(refused.body.detail).toMatchObject({ revision: 2, savedBy: 'Test person', savedById: other.id });
  });

  it('lets exactly one of many win who save at the same moment', async () => {
    const scene = await create({ name: 'Race' });
    const names = Array.from({ length: 8 }, (_, i) => `Version ${i}`);
    const answers = await Promise.all(
      names.map((name, i) => save(scene, { ...scene.document, name }, i % 2 ? other : designer)),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, ...Array<number>(7).fill(409)]);
    const read = await designer.browser.ask('get', `/api/scenes/${scene.id}`);
    expect(read.body.scene.document.name).toBe(names[answers.findIndex(({ status }) => status === 200)]);
    expect(read.body.scene.revision).toBe(2);
  });

  it('answers a save sent again, because its answer was lost, as the first time', async () => {
    const scene = await create({ name: 'Lost' });
    const first = await save(scene, { ...scene.document, name: 'Found' });
    const again = await save(scene, { ...scene.document, name: 'Found' });
    expect(again.status).toBe(200);
    expect(again.body).toEqual(first.body);
    expect((await save(scene, { ...scene.document, name: 'Found' }, other)).status).toBe(409);
  });

  it('takes the facts of an image from the server, not from the page', async () => {
    const photo = await uploadPhoto(await quadrants(300, 200).png().toBuffer(), 'facts.png');
    const scene = await create({ photoIds: [photo] });
    const [layer] = scene.document.layers;
    const lie = {
      ...layer,
      image: { ...layer.image, width: 9000, trim: { left: 5, top: 5, ofWidth: 1, ofHeight: 1 } },
    };
    const answer = await save(scene, { ...scene.document, layers: [lie] });
    expect(answer.body.scene.document.layers[0].image).toEqual(layer.image);
  });

  it('refuses impossible figures, field by field, and two layers with one id', async () => {
    const photo = await uploadPhoto(await quadrants(310, 200).png().toBuffer(), 'ids.png');
    const scene = await create({ photoIds: [photo] });
    const [layer] = scene.document.layers;
    const bad = await save(scene, { ...scene.document, glass: { widthMm: 0, heightMm: 681 } });
    expect(bad.status).toBe(400);
    expect(Object.keys(bad.body.fields)).toEqual(['document.glass.widthMm']);
    const alike = await save(scene, { ...scene.document, layers: [layer, layer] });
    expect(alike.body).toMatchObject({ code: 'layers-alike', fields: { 'document.layers.1.id': 'Used twice' } });
  });

  it("security: refuses another household's image in a document, saved or duplicated", async () => {
    const photo = await uploadPhoto(
      await quadrants(330, 210).png().toBuffer(),
      'theirs.png',
      elsewhere.designer,
      elsewhere.householdId,
    );
    const foreign = await create({ photoIds: [photo] }, elsewhere.designer, elsewhere.householdId);
    const scene = await create({ name: 'Ours' });
    const document = { ...scene.document, layers: foreign.document.layers };
    for (const answer of [
      await save(scene, document),
      await designer.browser.ask('post', `/api/scenes/${scene.id}/duplicates`, { document }),
    ]) {
      expect(answer.status).toBe(422);
      expect(answer.body).toMatchObject({
        code: 'image-not-here',
        fields: { 'document.layers.0.image': expect.any(String) },
      });
    }
    expect((await designer.browser.ask('get', `/api/images/${foreign.document.layers[0].image.id}/320`)).status).toBe(
      404,
    );
    expect(
      (await designer.browser.ask('post', `/api/scenes/${scene.id}/images/from-photo`, { photoId: photo })).status,
    ).toBe(422);
  });
});

describe('the list', () => {
  it('has the newest saved first, and nothing from the bin', async () => {
    const household = (await app.household()).id;
    const owner = await app.signedIn('owner', household);
    const a = await create({ name: 'A' }, owner, household);
    const b = await create({ name: 'B' }, owner, household);
    await save(a, { ...a.document, name: 'A again' }, owner);
    const names = async () =>
      (await owner.browser.ask('get', `/api/households/${household}/scenes`)).body.scenes.map(
        (scene: Scene) => scene.document.name,
      );
    expect(await names()).toEqual(['A again', 'B']);

    expect((await owner.browser.ask('delete', `/api/scenes/${b.id}`)).status).toBe(200);
    expect(await names()).toEqual(['A again']);
    const inBin = await owner.browser.ask('get', `/api/households/${household}/scenes?bin=true`);
    expect(inBin.body.scenes.map(({ id }: Scene) => id)).toEqual([b.id]);
    expect((await owner.browser.ask('get', `/api/scenes/${b.id}`)).body.code).toBe('in-bin');
    expect((await save(b, b.document, owner)).body.code).toBe('in-bin');
    expect((await owner.browser.ask('post', `/api/scenes/${b.id}/restoration`)).body.scene.document).toEqual(
      b.document,
    );
    expect(await names()).toEqual(['A again', 'B']);
  });
});
